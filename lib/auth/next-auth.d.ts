import "next-auth";
import "next-auth/jwt";

declare module "next-auth" {
  interface User {
    sessionEpoch: number;
  }
  interface Session {
    userId: string;
    sessionEpoch: number;
  }
}

declare module "next-auth/jwt" {
  interface JWT {
    userId: string;
    sessionEpoch: number;
  }
}
