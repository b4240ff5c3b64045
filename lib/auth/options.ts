import "server-only";
import type { NextAuthOptions } from "next-auth";
import CredentialsProvider from "next-auth/providers/credentials";
import { env } from "@/lib/env";
import { routes } from "@/lib/routes";
import { checkPassword } from "./check-password";
import { endSignIn, startSignIn } from "./sign-ins";
import { addressOf } from "./throttle";

/** The cookie carries the id of a sign-in; everything else is read from the database. */
export function authOptions(): NextAuthOptions {
  return {
    secret: env().NEXTAUTH_SECRET,
    session: { strategy: "jwt", maxAge: env().SESSION_MAX_HOURS * 3600 },
    pages: { signIn: routes.signIn(), error: routes.signIn() },
    providers: [
      CredentialsProvider({
        credentials: { email: {}, password: {} },
        async authorize(credentials, request) {
          if (!credentials) return null;
          const person = await checkPassword(
            credentials.email,
            credentials.password,
            addressOf(request.headers ?? {}),
          );
          return person ? { id: person.id, signInId: await startSignIn(person) } : null;
        },
      }),
    ],
    callbacks: {
      jwt: ({ token, user }) => (user ? { signInId: user.signInId } : token),
      session: ({ session, token }) => ({ expires: session.expires, signInId: token.signInId }),
    },
    events: {
      async signOut({ token }) {
        if (token?.signInId) await endSignIn(token.signInId);
      },
    },
  };
}
