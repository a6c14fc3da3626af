/** Memory in which a photo is warped by the vector kernel: photo, picture and samples on their way into a mean lie in it together. */
import "server-only";
import { LARGEST_ROOM, type Pixels, type Sampler, stepped } from "@/lib/layout";
import { type BilinearKernel, bilinearKernel, bytesReadBehind, hasVectors } from "./bilinear-kernel";

/** What `warpInBands` takes. Valid until the next `warpRoom` of this thread. */
export interface WarpRoom {
  readonly photo: Pixels;
  readonly picture: Pixels;
  readonly sampler: Sampler;
}

const pageBytes = 65_536;
const roomBytes = LARGEST_ROOM * 3;
/** Fresh memory costs more time than the copying into it, so a thread keeps its own, up to a 12-megapixel photo and its picture. */
const mostKeptBytes = 96 * 1024 * 1024;

let kept: { readonly memory: WebAssembly.Memory; readonly kernel: BilinearKernel } | undefined;

/** Copies the photo in and makes room for a picture of this size; null where there are no vector instructions or the photo has no three channels. */
export function warpRoom(photo: Pixels, width: number, height: number): WarpRoom | null {
  if (!hasVectors || photo.channels !== 3) return null;
  const stride = photo.width * 3;
  const pictureAt = roundUp(photo.data.length + bytesReadBehind(stride));
  const roomAt = roundUp(pictureAt + width * height * 3);
  const { memory, kernel } = memoryOf(roomAt + roomBytes);
  const bytesAt = (address: number, length: number) => new Uint8Array(memory.buffer, address, length);
  bytesAt(0, photo.data.length).set(photo.data);
  const [lastX, lastY] = [(photo.width - 1) * 256, (photo.height - 1) * 256];
  const sampler: Sampler = {
    room: (bytes) => bytesAt(roomAt, bytes),
    along(out, offset, count, alongX, alongY) {
      const [x, y] = [stepped(alongX), stepped(alongY)];
      const at = out.byteOffset + offset;
      kernel(0, stride, lastX, lastY, at, count, x.at, x.first, x.second, x.third, y.at, y.first, y.second, y.third);
    },
  };
  return {
    photo: { ...photo, data: bytesAt(0, photo.data.length) },
    picture: { data: bytesAt(pictureAt, width * height * 3), width, height, channels: 3 },
    sampler,
  };
}

function memoryOf(bytes: number): NonNullable<typeof kept> {
  const pages = Math.ceil(bytes / pageBytes);
  if (kept !== undefined && kept.memory.buffer.byteLength >= pages * pageBytes) return kept;
  const memory = new WebAssembly.Memory({ initial: pages });
  const made = { memory, kernel: bilinearKernel(memory) };
  kept = bytes <= mostKeptBytes ? made : undefined;
  return made;
}

const roundUp = (address: number): number => Math.ceil(address / 16) * 16;
