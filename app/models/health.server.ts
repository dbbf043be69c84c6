import { database } from "#database/connection";

/** Reads from the database's file. @throws whatever the database throws where it cannot answer */
export async function readAnything(): Promise<void> {
  await database().selectFrom("shop").select("id").limit(1).execute();
}
