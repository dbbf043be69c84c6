import { configuration } from "#database/configuration";
import { demoPassword, demoSignIns as people } from "#database/demo/people";

export { demoPassword };

/** The demo's people, where this installation is the demo. */
export function demoSignIns() {
  return configuration().demo ? people.map(({ email, what }) => ({ email, what })) : undefined;
}
