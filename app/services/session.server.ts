import { createHash, randomBytes } from "node:crypto";
import { createSessionStorage } from "react-router";
import { configuration } from "#database/configuration";
import { database } from "#database/connection";
import { instant } from "#database/id";

/** What a session remembers. */
export interface SessionData {
  personId: string;
  shopId: string;
}

interface SessionFlash {
  notice: string;
}

const twoWeeks = 14 * 24 * 60 * 60;

// Only the hash of a session's id is kept: who reads the database cannot take over a session.
const hashed = (id: string) => createHash("sha256").update(id).digest("hex");

function isSecure(): boolean {
  return configuration().baseUrl?.startsWith("https:") ?? false;
}

function makeStorage() {
  return createSessionStorage<SessionData, SessionFlash>({
    cookie: {
      name: isSecure() ? "__Host-tenthbook" : "tenthbook",
      httpOnly: true,
      sameSite: "lax",
      path: "/",
      secure: isSecure(),
      maxAge: twoWeeks,
      secrets: [configuration().sessionSecret],
    },
    async createData(data) {
      const id = randomBytes(32).toString("base64url");
      await database()
        .insertInto("session")
        .values({
          id: hashed(id),
          person_id: data.personId ?? null,
          shop_id: data.shopId ?? null,
          data_json: JSON.stringify(data),
          created_at: instant(),
          expires_at: instant(new Date(Date.now() + twoWeeks * 1000)),
        })
        .execute();
      return id;
    },
    async readData(id) {
      const row = await database()
        .selectFrom("session")
        .select(["data_json"])
        .where("id", "=", hashed(id))
        .where("expires_at", ">", instant())
        .executeTakeFirst();
      return row ? JSON.parse(row.data_json) : null;
    },
    async updateData(id, data) {
      await database()
        .updateTable("session")
        .set({
          person_id: data.personId ?? null,
          shop_id: data.shopId ?? null,
          data_json: JSON.stringify(data),
        })
        .where("id", "=", hashed(id))
        .execute();
    },
    async deleteData(id) {
      await database().deleteFrom("session").where("id", "=", hashed(id)).execute();
    },
  });
}

let storage: ReturnType<typeof makeStorage> | undefined;

/** The cookie sessions, held in the database so that they can be revoked. */
export function sessions() {
  storage ??= makeStorage();
  return storage;
}
