/** The program of a planning thread. Bundled on its own, because threads load plain JavaScript. */
import "server-only";
import { planAndVerify, planRestAndVerify } from "./plan-cuts";

export default planAndVerify;
/** Asked for by its name. */
export { planRestAndVerify };
