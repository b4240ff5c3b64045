import NextAuth from "next-auth";
import { OPEN_TO_ALL } from "@/lib/auth/policy";
import { authOptions } from "@/lib/auth/options";

type Context = { params: Promise<{ nextauth: string[] }> };

/** Sign-in and sign-out, as next-auth does them. */
const handle = Object.assign(
  async (request: Request, context: Context): Promise<Response> => {
    const response: unknown = await NextAuth(request as never, context as never, authOptions());
    if (response instanceof Response) return response;
    throw new Error("next-auth gave no response");
  },
  { permission: OPEN_TO_ALL },
);

export { handle as GET, handle as POST };
