import "server-only";
import type { NextAuthOptions } from "next-auth";
import CredentialsProvider from "next-auth/providers/credentials";
import { paths } from "@/lib/paths";
import { forgetTurns, takeTurn } from "@/lib/http/rate-limit";
import { signInSchema } from "@/lib/schemas/account";
import { verifySignIn } from "./verify-sign-in";

/** Wrong passwords in a row for one address in a quarter of an hour. */
const TRIES = 30;
const WINDOW_S = 900;

export const authOptions: NextAuthOptions = {
  session: { strategy: "jwt", maxAge: 30 * 24 * 3600 },
  pages: { signIn: paths.signIn() },
  providers: [
    CredentialsProvider({
      credentials: { email: {}, password: {} },
      async authorize(credentials) {
        const parsed = signInSchema.safeParse({ email: credentials?.email, password: credentials?.password });
        if (!parsed.success) return null;
        const { email, password } = parsed.data;
        const key = `sign-in:${email}`;
        if (!takeTurn(key, TRIES, WINDOW_S).allowed) return null;
        const user = await verifySignIn(email, password);
        if (user) forgetTurns(key);
        return user && { id: user.id, name: user.name, email: user.email, sessionEpoch: user.sessionEpoch };
      },
    }),
  ],
  callbacks: {
    jwt({ token, user }) {
      if (user) {
        token.userId = user.id;
        token.sessionEpoch = user.sessionEpoch;
      }
      return token;
    },
    session({ session, token }) {
      session.userId = token.userId;
      session.sessionEpoch = token.sessionEpoch;
      return session;
    },
  },
};
