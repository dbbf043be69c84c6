import { database } from "#database/connection";
import { instant, newId } from "#database/id";

const window = 15 * 60 * 1000;

// A stranger's failures count only against the stranger's own address, so nobody can lock a person out of their shop;
// the count over all addresses is wide and only slows a guess that is spread over many.
const limits = { pair: 8, address: 40, email: 100 };

/** How many seconds an address must wait before it may try this e-mail address again; 0 when it may try now. */
export async function secondsToWait(email: string, address: string): Promise<number> {
  const since = instant(new Date(Date.now() - window));
  const failures = await database()
    .selectFrom("sign_in_attempt")
    .select(["email", "address", "attempted_at"])
    .where("succeeded", "=", 0)
    .where("attempted_at", ">", since)
    .where((either) => either.or([either("email", "=", email), either("address", "=", address)]))
    .orderBy("attempted_at", "desc")
    .limit(200)
    .execute();
  const sameEmail = failures.filter((failure) => failure.email.toLowerCase() === email.toLowerCase());
  const sameAddress = failures.filter((failure) => failure.address === address);
  const pair = sameEmail.filter((failure) => failure.address === address);
  const tooMany =
    pair.length >= limits.pair || sameAddress.length >= limits.address || sameEmail.length >= limits.email;
  const latest = failures[0];
  if (!tooMany || !latest) return 0;
  const oneMinuteOn = new Date(latest.attempted_at).getTime() + 60_000;
  return Math.max(0, Math.ceil((oneMinuteOn - Date.now()) / 1000));
}

/** Remembers a try at signing in, and forgets those too old to count. */
export async function recordAttempt(email: string, address: string, succeeded: boolean): Promise<void> {
  await database()
    .insertInto("sign_in_attempt")
    .values({ id: newId(), email, address, succeeded: succeeded ? 1 : 0, attempted_at: instant() })
    .execute();
  await database()
    .deleteFrom("sign_in_attempt")
    .where("attempted_at", "<", instant(new Date(Date.now() - 24 * 60 * 60 * 1000)))
    .execute();
}
