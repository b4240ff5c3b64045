/** Parses JSON and sends the same back. */
export async function POST(request) {
  return Response.json(await request.json());
}
