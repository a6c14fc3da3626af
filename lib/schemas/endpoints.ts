/** Every endpoint there is, for the OpenAPI document. A test holds this list against the route files. */
import * as asCut from "./as-cut";
import * as blank from "./blank";
import * as board from "./board";
import type { Endpoint } from "./endpoint";
import * as figure from "./figure";
import * as history from "./history";
import * as job from "./job";
import * as layout from "./layout";
import * as movement from "./movement";
import * as order from "./order";
import * as photo from "./photo";
import * as rest from "./rest";
import * as service from "./service";
import * as session from "./session";
import * as shop from "./shop";
import * as species from "./species";
import * as straightening from "./straightening";
import * as task from "./task";
import * as woodSearch from "./wood-search";

const isEndpoint = (value: unknown): value is Endpoint =>
  typeof value === "object" && value !== null && "method" in value && "path" in value && "access" in value;

export const endpoints: readonly Endpoint[] = [
  service,
  session,
  shop,
  species,
  board,
  blank,
  photo,
  straightening,
  task,
  job,
  layout,
  figure,
  movement,
  order,
  asCut,
  rest,
  woodSearch,
  history,
].flatMap((noun) => Object.values(noun).filter(isEndpoint));
