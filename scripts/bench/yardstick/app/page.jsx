export const dynamic = "force-dynamic";

/** The framework's empty page: what it sends to a browser before anybody adds anything. */
export default function EmptyPage() {
  return <main>Empty</main>;
}
