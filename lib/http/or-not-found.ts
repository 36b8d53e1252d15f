import { notFound } from "next/navigation";
import { AppError } from "@/lib/errors";

/** For pages: a row that is not there, or not for this person, becomes the 404 page. */
export async function orNotFound<T>(work: Promise<T>): Promise<T> {
  try {
    return await work;
  } catch (error) {
    if (error instanceof AppError && error.code === "not-found") notFound();
    throw error;
  }
}
