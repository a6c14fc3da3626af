"use client";
/** Drawing what of a board is usable, and what no show piece may touch, on its straightened picture. */
import { Redo2, Undo2 } from "lucide-react";
import Link from "next/link";
import { useMemo } from "react";
import { messageOf } from "@/lib/client/fault-from-server";
import { mmFromUm } from "@/lib/layout";
import type { Board } from "@/lib/schemas/board";
import type { Straightening } from "@/lib/schemas/straightening";
import type { KeepClearArea } from "@/lib/schemas/zones";
import { PictureStage, type Stroke } from "../picture/picture-stage";
import { useStageView } from "../picture/use-stage-view";
import type { Place } from "../picture/view";
import { useUnits } from "../shell/units";
import { Button } from "../ui/button";
import { Notice } from "../ui/notice";
import { PageTitle } from "../ui/page-title";
import { PanelSection } from "../ui/panel-section";
import { useUnsavedWarning } from "../ui/use-unsaved-warning";
import { AreaList } from "./area-list";
import { ConflictDialog } from "./conflict-dialog";
import { CornerBar } from "./corner-bar";
import { GlueLinePanel } from "./glue-line-panel";
import { OtherSidePanel } from "./other-side-panel";
import { OutlinePanel } from "./outline-panel";
import { Rulers, TAPE_PX } from "./rulers";
import { SuggestionPanel } from "./suggestion-panel";
import { ToolNotice } from "./tool-notice";
import { useSaveZones } from "./use-save-zones";
import { type Tool, useUndoKeys, useZones } from "./use-zones";
import { ZoneHandles } from "./zone-handles";
import { faultWords, middleOf } from "./zone-words";
import { docFault } from "./zones-doc";
import { ZonesDrawing } from "./zones-drawing";

/** CSS pixels per mm at the nearest zoom: a tenth of a millimetre can then be pointed at. */
const MOST_SCALE = 16;
/** Choosing an area from the list zooms in at least this far. */
const SCALE_AT_AREA = 2;
/** A finger hits within this, CSS px. */
const REACH_PX = 14;

const toUm = ({ x, y }: Place): Place => ({ x: x * 1000, y: y * 1000 });

interface Props {
  board: Board;
  straightening: Straightening;
  /** The present picture of the board's other side, if there is one. */
  otherSide: Straightening | null;
}

export function ZonesScreen({ board, straightening, otherSide }: Props) {
  const { style } = useUnits();
  const { length, width } = straightening;
  const size = useMemo(() => ({ width: mmFromUm(length), height: mmFromUm(width) }), [length, width]);
  const zones = useZones(straightening.zones, { length, width });
  const stage = useStageView(size, MOST_SCALE, TAPE_PX + 18);
  const saving = useSaveZones(straightening, zones);
  const fault = useMemo(() => docFault(zones.doc, { length, width }), [zones.doc, length, width]);
  useUnsavedWarning(zones.dirty);
  useUndoKeys(zones);

  const onStroke = ({ phase, from, to }: Stroke) =>
    phase === "dropped" ? zones.preview(null) : zones.drawBox(toUm(from), toUm(to), phase === "end");
  const take = (tool: Tool) => {
    zones.select(null);
    zones.take(tool);
    stage.reveal();
  };
  const look = (area: KeepClearArea) => {
    const { x, y } = middleOf(area);
    stage.lookAt({ x: x / 1000, y: y / 1000 }, SCALE_AT_AREA);
    stage.reveal();
  };
  const show = (area: KeepClearArea) => {
    look(area);
    zones.take("select");
    zones.select({ what: "area", id: area.id });
  };
  return (
    <>
      <PageTitle
        title={`Outline and keep-clear areas of ${straightening.side === "back" ? "the back of " : ""}${board.tag}`}
        above={
          <Link href={`/rack/${board.id}`} className="underline">
            {board.tag}, {board.species}
          </Link>
        }
      >
        <span role="status" className="text-sm text-pencil">
          {saving.saving ? "Saving" : zones.dirty ? "Not saved" : "Saved"}
        </span>
        <Button aria-label="Undo" disabled={!zones.canUndo} onClick={zones.undo}>
          <Undo2 className="size-5" aria-hidden="true" />
        </Button>
        <Button aria-label="Redo" disabled={!zones.canRedo} onClick={zones.redo}>
          <Redo2 className="size-5" aria-hidden="true" />
        </Button>
        <Button kind="primary" disabled={!zones.dirty || fault !== null || saving.saving} onClick={saving.save}>
          Save
        </Button>
      </PageTitle>
      <div className="lg:grid lg:grid-cols-[minmax(0,1fr)_23rem]">
        <div className="min-w-0 lg:sticky lg:top-0 lg:self-start">
          <PictureStage
            label={`Straightened picture of ${straightening.side === "back" ? "the back of " : ""}${board.tag}`}
            stage={stage}
            size={size}
            levels={straightening.levels}
            onTap={(at) => zones.tap(toUm(at), (REACH_PX / stage.view.scale) * 1000)}
            onStroke={zones.tool === "ellipse" ? onStroke : undefined}
            onEscape={() => (zones.tool === "select" ? zones.select(null) : zones.take("select"))}
            crossHair={zones.tool !== "select"}
            className="h-[48dvh] min-h-64 lg:h-[calc(100dvh-15rem)]"
          >
            <ZonesDrawing zones={zones} view={stage.view} fault={fault} />
            <Rulers stage={stage} size={zones.size} />
            <ZoneHandles zones={zones} view={stage.view} />
          </PictureStage>
          <div className="flex flex-col gap-3 px-4 py-3 empty:hidden">
            <ToolNotice zones={zones} />
            <CornerBar zones={zones} />
            {fault && <Notice kind="stop">{faultWords(fault, style)}</Notice>}
            {saving.error && <Notice kind="stop">{messageOf(saving.error)}</Notice>}
          </div>
        </div>
        <div className="border-rule bg-sheet lg:border-l">
          <OutlinePanel zones={zones} onTool={take} />
          <PanelSection title="Keep clear" lead="No show piece may touch these. Anything else on the board may be used.">
            <div className="flex flex-wrap gap-2">
              <Button size="small" aria-pressed={zones.tool === "ellipse"} onClick={() => take("ellipse")}>
                Add an ellipse
              </Button>
              <Button size="small" aria-pressed={zones.tool === "polygon"} onClick={() => take("polygon")}>
                Add a polygon
              </Button>
            </div>
            <AreaList zones={zones} onShow={show} />
          </PanelSection>
          <SuggestionPanel straighteningId={straightening.id} zones={zones} onLook={look} />
          {otherSide && <OtherSidePanel zones={zones} from={otherSide} />}
          <GlueLinePanel board={board} zones={zones} onTool={take} />
        </div>
      </div>
      <ConflictDialog saving={saving} mine={zones.doc} />
    </>
  );
}
