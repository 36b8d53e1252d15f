import { createAccount } from "@/lib/data/create-account";
import { handle, json } from "@/lib/http/handle";
import { readJson } from "@/lib/http/read-json";
import { signUpSchema } from "@/lib/schemas/account";

export const POST = handle(async (request) => {
  const account = await createAccount(await readJson(request, signUpSchema));
  return json({ account }, 201);
});
