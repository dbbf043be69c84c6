// Brings the development database up to date and fills a new one with the demo.
import { database } from "#database/connection";
import { seedDemo } from "#database/demo/seed";
import { migrate } from "#database/migrate";

await migrate(database());
await seedDemo();
await database().destroy();
