import "next-auth";
import "next-auth/jwt";

declare module "next-auth" {
  interface User {
    id: string;
    signInId: string;
  }
  interface Session {
    signInId?: string | undefined;
  }
}

declare module "next-auth/jwt" {
  interface JWT {
    signInId?: string;
  }
}
