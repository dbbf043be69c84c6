import { run } from "./zz-proto";
import { proto, opts } from "./zz-policy";
import { families, widerFamily } from "./family";
import { halving } from "./plain-policies";
const n = Number(process.argv[2] ?? 200);
const t = Date.now();
run({ proto }, [...families, widerFamily], n, 1000);
console.log((Date.now() - t) / 1000, "s");
