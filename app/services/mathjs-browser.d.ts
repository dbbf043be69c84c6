// mathjs's single-file build is an export of the package without types of its own; they are the package's.
declare module "mathjs/lib/browser/math.js" {
  import * as mathjs from "mathjs";
  export default mathjs;
}
