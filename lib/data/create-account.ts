import "server-only";
import { randomUUID } from "node:crypto";
import { AppError, fieldFault } from "@/lib/errors";
import { hashPassword } from "@/lib/auth/password";
import { User } from "@/models";
import { writeTx } from "./database";

interface NewAccount {
  name: string;
  email: string;
  password: string;
}

/** A new account. @throws AppError conflict when the address has one already */
export async function createAccount(account: NewAccount): Promise<{ id: string; name: string; email: string }> {
  const passwordHash = await hashPassword(account.password);
  return writeTx(async (transaction) => {
    if (await User.findOne({ where: { email: account.email }, transaction })) {
      throw new AppError("conflict", {
        userMessage: "There is an account with this e-mail address already.",
        fields: [fieldFault(["email"], "There is an account with this address already. Sign in instead.")],
      });
    }
    const user = await User.create({ id: randomUUID(), name: account.name, email: account.email, passwordHash, createdAt: new Date() }, { transaction });
    return { id: user.id, name: user.name, email: user.email };
  });
}
