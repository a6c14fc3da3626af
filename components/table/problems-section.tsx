"use client";
import { useUnits } from "@/components/shell/units";
import { Button } from "@/components/ui/button";
import { piecesOfProblem } from "@/lib/editor/selectors/facts";
import type { TakenBoard } from "@/lib/editor/selectors/taken-boards";
import { type Problem, type Um, um } from "@/lib/layout";
import { standsInTheWay } from "@/lib/schemas/spoken-for";
import { problemSentence } from "@/lib/words/layout-problem";
import { takenBySentence } from "@/lib/words/taken-by";
import { PanelSection } from "./panel-section";
import { useTableActions } from "./table-actions";
import { useEditorState, useTableContext } from "./table-context";
import { useNamed } from "./use-named";
import type { Problems } from "./use-problems";

interface Props {
  problems: Problems;
  taken: readonly TakenBoard[];
}

const looks = { firm: "border-crayon bg-crayon-wash", told: "border-tape bg-tape-wash" };
const itemLook = "flex flex-col gap-1.5 rounded-sm border-l-4 px-3 py-2 text-sm";

export function ProblemsSection({ problems: { found, working }, taken }: Props) {
  const firm = found.filter(standsInTheWay);
  const count = taken.length + found.length;
  // What keeps the layout from being issued comes first.
  const inOrder = [...firm, ...found.filter((problem) => !firm.includes(problem))];
  return (
    <PanelSection title="Problems" beside={count > 0 ? count : working ? "looking…" : "none"}>
      {count === 0 ? (
        <p className="text-sm text-moss">
          {working
            ? "Working out whether straight cuts part the fronts…"
            : "Every front lies on sound wood, and straight cuts part them."}
        </p>
      ) : (
        <ul className="flex flex-col gap-2">
          {taken.map(({ id, tag, takenBy }) => (
            <li key={id} className={`${itemLook} ${looks.firm}`}>
              {takenBySentence(tag, takenBy)}
            </li>
          ))}
          {inOrder.map((problem) => (
            <ProblemItem key={JSON.stringify(problem)} problem={problem} />
          ))}
        </ul>
      )}
    </PanelSection>
  );
}

function ProblemItem({ problem }: { problem: Problem }) {
  const { editor } = useTableContext();
  const { style } = useUnits();
  const named = useNamed();
  const planned = problem.kind === "spoken-for" && named.woodOf(problem.spokenForId)?.issued === false;
  return (
    <li className={`${itemLook} ${standsInTheWay(problem) ? looks.firm : looks.told}`}>
      <button
        type="button"
        onClick={() => editor.select(piecesOfProblem(problem))}
        className="min-h-8 text-left underline-offset-2 hover:underline"
      >
        {problemSentence(problem, style, named)}
      </button>
      {planned && <p>That face is laid out but not issued. Whichever of the two is issued first has the board.</p>}
      {editor.mayChange && <Mend problem={problem} />}
    </li>
  );
}

/** What would mend it, as a button, where one step does. */
function Mend({ problem }: { problem: Problem }) {
  const { print } = useUnits();
  const { slideOf, layOn } = useTableActions();
  const boards = useEditorState((state) => state.boards);
  if ("slide" in problem && problem.slide !== null && problem.slide !== 0) {
    const { slide, piece } = problem;
    return (
      <Button size="small" className="self-start" onClick={() => slideOf(piece, slide)}>
        Slide {print(magnitude(slide))} {slide < 0 ? "left" : "right"}
      </Button>
    );
  }
  if (problem.kind === "not-placed" && boards.length > 0) {
    return (
      <span className="flex flex-wrap gap-2">
        {boards.map(({ face, tag }) => (
          <LayButton key={face.id} tag={tag} pieces={problem.pieces} onLay={() => layOn(face)} />
        ))}
      </span>
    );
  }
  return null;
}

function LayButton({ tag, pieces, onLay }: { tag: string; pieces: readonly string[]; onLay: () => void }) {
  const { editor } = useTableContext();
  return (
    <Button
      size="small"
      onClick={() => {
        editor.select(pieces);
        onLay();
      }}
    >
      Lay on {tag}
    </Button>
  );
}

const magnitude = (length: Um) => um(Math.abs(length));
