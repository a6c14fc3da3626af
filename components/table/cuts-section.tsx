"use client";
import { useUnits } from "@/components/shell/units";
import { SelectField } from "@/components/ui/field";
import { LengthField } from "@/components/ui/length-field";
import { changeLoss, changeSpacing, chooseAnchor, chooseSaw } from "@/lib/editor/commands/change-cuts";
import {
  type AnchorX,
  type AnchorY,
  type CutDirection,
  type CutLoss,
  cutBetween,
  type FaceLayout,
  facePieces,
  lossOf,
  sliverOf,
  type Um,
  um,
} from "@/lib/layout";
import { PanelSection } from "./panel-section";
import { useEditorState, useTableContext } from "./table-context";

const cutNames: Readonly<Record<CutDirection, string>> = { crosscut: "Crosscuts", rip: "Rips" };

export function CutsSection() {
  const { editor } = useTableContext();
  const layout = useEditorState((state) => state.document.layout);
  const { print } = useUnits();
  return (
    <PanelSection title="What the cuts cost">
      {(["crosscut", "rip"] as const).map((direction) => (
        <CutFields key={direction} direction={direction} />
      ))}
      <SelectField
        label="Spacing"
        hint={
          layout.spacing === "followGap"
            ? "A second cut takes the sliver out, so that the figure runs on over the gap."
            : "Fronts lie the loss apart: saves wood, and the figure jumps by what the gap differs."
        }
        value={layout.spacing}
        disabled={!editor.mayChange}
        onChange={(event) => {
          const spacing = event.target.value;
          if (spacing === "followGap" || spacing === "tight") editor.run((document) => changeSpacing(document, spacing));
        }}
      >
        <option value="followGap">Follow the gap</option>
        <option value="tight">Tight</option>
      </SelectField>
      <div className="grid grid-cols-2 gap-3">
        <AnchorField axis="x" />
        <AnchorField axis="y" />
      </div>
      <p className="text-xs text-pencil">
        The anchor stays where it is in the wood when sizes, gaps or losses change. Loss here: {print(lossOf(layout.crosscut))} at
        a crosscut, {print(lossOf(layout.rip))} at a rip.
      </p>
    </PanelSection>
  );
}

function CutFields({ direction }: { direction: CutDirection }) {
  const { editor, saws } = useTableContext();
  const { print } = useUnits();
  const layout = useEditorState((state) => state.document.layout);
  const sawId = useEditorState((state) => (direction === "rip" ? state.document.ripSawId : state.document.crosscutSawId));
  const cut = layout[direction];
  const change = (part: Partial<CutLoss>) => editor.run((document) => changeLoss(document, direction, { ...cut, ...part }));
  const sliver = largestSliver(layout, direction);
  return (
    <fieldset className="flex flex-col gap-2" disabled={!editor.mayChange}>
      <SelectField
        label={`${cutNames[direction]}: saw`}
        value={sawId ?? ""}
        onChange={(event) => {
          const saw = saws.find(({ id }) => id === event.target.value);
          if (saw) editor.run((document) => chooseSaw(document, direction, saw));
        }}
      >
        <option value="" disabled={sawId !== null}>
          Entered by hand
        </option>
        {saws.map(({ id, name }) => (
          <option key={id} value={id}>
            {name}
          </option>
        ))}
      </SelectField>
      <div className="grid grid-cols-3 items-end gap-2">
        <LengthField label="Kerf" value={cut.kerf} onChange={(kerf) => kerf !== null && change({ kerf: atLeastNothing(kerf) })} />
        <LengthField
          label={direction === "crosscut" ? "Clean-up, right" : "Clean-up, below"}
          value={cut.cleanUpBefore}
          onChange={(length) => length !== null && change({ cleanUpBefore: atLeastNothing(length) })}
        />
        <LengthField
          label={direction === "crosscut" ? "and left" : "and above"}
          value={cut.cleanUpAfter}
          onChange={(length) => length !== null && change({ cleanUpAfter: atLeastNothing(length) })}
        />
      </div>
      <p className="flex justify-between text-sm">
        <span className="text-pencil">Loss at each cut</span>
        <span className="measure">{print(lossOf(cut))}</span>
      </p>
      {sliver !== null && (
        <p className="flex justify-between text-sm">
          <span className="text-pencil">Sliver to make the gap</span>
          <span className="measure">{print(sliver)}</span>
        </p>
      )}
    </fieldset>
  );
}

/** The widest sliver that a second cut of this kind takes out of a grid; null where no fronts are parted by such cuts. */
function largestSliver({ face, spacing, ...cuts }: FaceLayout, direction: CutDirection): Um | null {
  if (face.pattern !== "grid") return null;
  const gaps = cutBetween("columns", face.grain) === direction ? face.columnGaps : face.rowGaps;
  if (gaps.length === 0) return null;
  return um(Math.max(...gaps.map((gap) => sliverOf(cuts[direction], gap, spacing))));
}

function AnchorField({ axis }: { axis: "x" | "y" }) {
  const { editor } = useTableContext();
  const layout = useEditorState((state) => state.document.layout);
  const anchor = axis === "x" ? layout.anchorX : layout.anchorY;
  const places = axis === "x" ? (["left", "centre", "right"] as const) : (["top", "centre", "bottom"] as const);
  return (
    <SelectField
      label={axis === "x" ? "Anchor, sideways" : "Anchor, upright"}
      value={typeof anchor === "object" ? anchor.piece : anchor}
      disabled={!editor.mayChange}
      onChange={(event) => {
        const { value } = event.target;
        editor.run((document) =>
          axis === "x"
            ? chooseAnchor(document, anchorXOf(value), document.layout.anchorY)
            : chooseAnchor(document, document.layout.anchorX, anchorYOf(value)),
        );
      }}
    >
      {places.map((place) => (
        <option key={place} value={place}>
          {place}
        </option>
      ))}
      {facePieces(layout).map(({ id, label }) => (
        <option key={id} value={id}>
          front {label}
        </option>
      ))}
    </SelectField>
  );
}

function anchorXOf(value: string): AnchorX {
  return value === "left" || value === "centre" || value === "right" ? value : { piece: value };
}

function anchorYOf(value: string): AnchorY {
  return value === "top" || value === "centre" || value === "bottom" ? value : { piece: value };
}

function atLeastNothing(length: Um): Um {
  return length < 0 ? um(0) : length;
}
