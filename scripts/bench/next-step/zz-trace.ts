import { proto, opts } from "./zz-policy";
import { families, widerFamily } from "./family";
import { Shop } from "./shop";
import { playSeason } from "./season";
opts.trace = true;
const f = [...families, widerFamily][Number(process.argv[2])]!;
for (let s = 0; s < Number(process.argv[3]); s++) { const shop: any = new Shop(f, 1000 + s); console.log("--- crit", shop.critical, "s", shop.slope, "r0", shop.baseRate); console.log(playSeason(shop, proto)); }
