/** The program of a thread that takes the demo's photographs: seconds of reckoning each. */
import { photograph } from "./photograph";

export default photograph;
