/**
 * What a change of a layout comes to: the new layout, or a refusal that says why in figures. All changes are pure; none looks at
 * boards, so a change may lead to problems (`fit/problems.ts`) that are shown rather than refused.
 */
import type { PieceId } from "../piece";
import type { Um } from "../units/um";
import type { FaceLayout, PieceGroup } from "./face-layout";

export interface PieceSize {
  readonly width: Um;
  readonly height: Um;
}

export type LayoutRefusal =
  | { readonly reason: "unknown-piece"; readonly piece: PieceId }
  | { readonly reason: "unknown-group"; readonly groupId: string }
  /** The group does not lie on any board yet. */
  | { readonly reason: "not-placed"; readonly groupId: string }
  /** The piece is a group of its own already, or the only piece of the set. */
  | { readonly reason: "already-loose"; readonly piece: PieceId }
  /** These are sawn as one blank: none of them goes without the others. */
  | { readonly reason: "one-blank"; readonly pieces: readonly PieceId[] }
  | { readonly reason: "already-in-set"; readonly piece: PieceId }
  | { readonly reason: "same-piece"; readonly piece: PieceId }
  /** A front cannot take the place of a part of the rail. */
  | { readonly reason: "roles-differ"; readonly pieces: readonly [PieceId, PieceId] }
  /** Two pieces can change places only when they are of one size. */
  | {
      readonly reason: "sizes-differ";
      readonly pieces: readonly [PieceId, PieceId];
      readonly sizes: readonly [PieceSize, PieceSize];
    };

export type LayoutChange =
  | { readonly ok: true; readonly layout: FaceLayout }
  | { readonly ok: false; readonly refusal: LayoutRefusal };

export function changed(layout: FaceLayout): LayoutChange {
  return { ok: true, layout };
}

export function refused(refusal: LayoutRefusal): LayoutChange {
  return { ok: false, refusal };
}

/** The group of that id, or null. */
export function groupById(layout: FaceLayout, groupId: string): PieceGroup | null {
  return layout.groups.find((group) => group.id === groupId) ?? null;
}

/** The layout with one group in the place of the group of the same id. */
export function withGroup(layout: FaceLayout, group: PieceGroup): FaceLayout {
  return { ...layout, groups: layout.groups.map((old) => (old.id === group.id ? group : old)) };
}
