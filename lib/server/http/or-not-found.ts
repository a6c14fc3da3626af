/** For pages: a use case's "not found" becomes the 404 page. Ids in addresses need no other check, since none but the shop's own is found. */
import "server-only";
import { notFound } from "next/navigation";
import { FaultError } from "../faults";

export async function orNotFound<T>(wanted: Promise<T>): Promise<T> {
  try {
    return await wanted;
  } catch (error) {
    if (error instanceof FaultError && error.code === "not-found") notFound();
    throw error;
  }
}
