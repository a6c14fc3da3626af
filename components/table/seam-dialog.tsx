"use client";
/** A seam magnified, with both sides of it as the face will hang, and what is known of it in words. */
import { ChevronLeft, ChevronRight } from "lucide-react";
import { useRef } from "react";
import { FacePicture } from "@/components/picture/face-picture";
import { usePictures } from "@/components/picture/use-pictures";
import { useSize } from "@/components/picture/use-size";
import { Button } from "@/components/ui/button";
import { Modal } from "@/components/ui/modal";
import { factsOf } from "@/lib/editor/selectors/facts";
import type { SeamRelation } from "@/lib/editor/selectors/seam-relation";
import type { FaceLayout, Seam } from "@/lib/layout";
import type { SeamReadingOnWire } from "@/lib/schemas/figure";
import { SeamFacts } from "./seam-facts";
import { seamWindow } from "./seam-window";
import { useEditorState } from "./table-context";

interface Props {
  layout: FaceLayout;
  seam: Seam | null;
  relation: SeamRelation;
  reading: SeamReadingOnWire | null;
  onClose: () => void;
  /** To the seam before or after in the list. */
  onStep: (by: 1 | -1) => void;
}

/** Screen pixels per mm: a grain line of half a millimetre is three wide. Fewer where the dialog is too narrow to show both sides at once. */
const MOST_PX_PER_MM = 6;

export function SeamDialog({ layout, seam, relation, reading, onClose, onStep }: Props) {
  const title = seam ? `Seam between ${seam.a.slice(1)} and ${seam.b.slice(1)}` : "";
  return (
    <Modal open={seam !== null} onOpenChange={(open) => !open && onClose()} title={title}>
      {seam && (
        <>
          <Magnified layout={layout} seam={seam} />
          <div className="my-3 flex justify-between gap-2">
            <Button size="small" onClick={() => onStep(-1)}>
              <ChevronLeft className="size-4" aria-hidden="true" /> Seam before
            </Button>
            <Button size="small" onClick={() => onStep(1)}>
              Next seam <ChevronRight className="size-4" aria-hidden="true" />
            </Button>
          </div>
          <SeamFacts
            seam={seam}
            relation={relation}
            reading={reading}
            face={layout.face}
            drift={factsOf(layout).drifts.get(seam.b) ?? null}
          />
        </>
      )}
    </Modal>
  );
}

function Magnified({ layout, seam }: { layout: FaceLayout; seam: Seam }) {
  const atHand = usePictures();
  const boards = useEditorState((state) => state.boards);
  const ref = useRef<HTMLDivElement>(null);
  const room = useSize(ref);
  const view = seamWindow(seam);
  const across = (seam.normal === "right" ? view.width : view.height) / 1000;
  const pxPerMm = Math.min(MOST_PX_PER_MM, Math.max(1, (seam.normal === "right" ? room.width : 300) / across));
  return (
    // Long seams are scrolled along, so the window must be reachable by keyboard.
    <section
      ref={ref}
      aria-label="Magnified seam"
      // biome-ignore lint/a11y/noNoninteractiveTabindex: a region that scrolls has to take the focus to be scrolled by keyboard
      tabIndex={0}
      className="max-h-[46dvh] overflow-auto border border-line bg-graphite focus-visible:outline-2 focus-visible:outline-chalk"
    >
      {room.width > 0 && (
        <FacePicture
          label={`Both sides of the seam, ${Math.round(across)} mm of wood across it`}
          layout={layout}
          boards={boards}
          view={view}
          pxPerMm={pxPerMm}
          atHand={atHand}
        />
      )}
    </section>
  );
}
