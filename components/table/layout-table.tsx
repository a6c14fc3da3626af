"use client";
/** The layout table of one face. */
import { Download } from "lucide-react";
import Link from "next/link";
import { useCallback, useEffect, useRef, useState } from "react";
import { buttonClass } from "@/components/ui/button";
import { PageTitle } from "@/components/ui/page-title";
import { useUnsavedWarning } from "@/components/ui/use-unsaved-warning";
import { showSideAddress } from "@/lib/client/layout";
import type { TableView } from "@/lib/editor/canvas/table-view";
import { takenBoards } from "@/lib/editor/selectors/taken-boards";
import { isStuck } from "@/lib/editor/sync/status";
import type { Layout } from "@/lib/schemas/layout";
import type { Shop } from "@/lib/schemas/shop";
import { BoardsSection } from "./boards-section";
import { ConflictDialog } from "./conflict-dialog";
import { CutsSection } from "./cuts-section";
import { GluingSection } from "./gluing-section";
import { HelpDialog } from "./help-dialog";
import { IssueButton } from "./issue-button";
import { LeavesSection } from "./leaves-section";
import { LiveLine } from "./live-line";
import { MovementSection } from "./movement-section";
import { ProblemsSection } from "./problems-section";
import { RunSection } from "./run-section";
import { SaveStatus } from "./save-status";
import { SeamsSection } from "./seams-section";
import { SizesSection } from "./sizes-section";
import { useTableActions } from "./table-actions";
import { TableProvider, useEditorState } from "./table-context";
import { pressUndoKey } from "./table-keys";
import { TableSides } from "./table-sides";
import { ToolBar } from "./tool-bar";
import { useIssuing } from "./use-issuing";
import { useProblems } from "./use-problems";
import { useTable } from "./use-table";

interface Props {
  initial: Layout;
  shop: Shop;
  mayChange: boolean;
}

export function LayoutTable({ initial, shop, mayChange }: Props) {
  const table = useTable(initial, mayChange);
  return (
    <TableProvider value={{ ...table, faceId: initial.faceId, jobId: initial.jobId, shop, saws: shop.saws }}>
      <TableScreen initial={initial} mayChange={mayChange} />
    </TableProvider>
  );
}

function TableScreen({ initial, mayChange }: Omit<Props, "shop">) {
  const viewRef = useRef<TableView | null>(null);
  const [helping, setHelping] = useState(false);
  const help = useCallback(() => setHelping(true), []);
  const problems = useProblems();
  const issuing = useIssuing(initial);
  const boards = useEditorState((state) => state.boards);
  const document = useEditorState((state) => state.document);
  const taken = takenBoards(document, boards, issuing.asItStands);
  useUndoKeys();
  // What is on its way goes out when a link leads away; what is stuck would be lost.
  useUnsavedWarning(useEditorState(({ sync }) => isStuck(sync)));
  return (
    <div className="flex flex-col lg:h-[calc(100dvh-3.25rem)]">
      <PageTitle
        title={initial.faceTitle}
        above={
          <>
            <Link href={`/jobs/${initial.jobId}`} className="underline-offset-2 hover:underline">
              {initial.jobTitle}
            </Link>
            {mayChange && (
              <>
                {" · "}
                <SaveStatus />
              </>
            )}
          </>
        }
      >
        <ShowSideLink faceId={initial.faceId} title={initial.faceTitle} />
        <IssueButton issuing={issuing} problems={problems} taken={taken} />
      </PageTitle>
      <ToolBar viewRef={viewRef} onHelp={help} />
      <div className="grid min-h-0 flex-1 lg:grid-cols-[minmax(0,1fr)_21rem]">
        <div className="flex min-h-0 min-w-0 flex-col [&>div]:flex-1">
          <TableSides viewRef={viewRef} onHelp={help} />
          <LiveLine />
        </div>
        <aside
          aria-label="About this layout"
          className="min-h-0 border-rule bg-sheet md:columns-2 md:gap-0 lg:columns-auto lg:overflow-y-auto lg:border-l"
        >
          <ProblemsSection problems={problems} taken={taken} />
          <SeamsSection />
          <BoardsSection asItStands={issuing.asItStands} />
          <CutsSection />
          <GluingSection />
          <RunSection />
          <LeavesSection />
          <SizesSection />
          <MovementSection />
        </aside>
      </div>
      <HelpDialog open={helping} onOpenChange={setHelping} />
      <ConflictDialog />
    </div>
  );
}

/** The picture is drawn by the server from what is saved. */
function ShowSideLink({ faceId, title }: { faceId: string; title: string }) {
  const lies = useEditorState(({ document }) => document.layout.groups.some(({ placement }) => placement !== null));
  if (!lies) return null;
  return (
    <a href={showSideAddress(faceId, {})} download={`${title}.png`} className={buttonClass()}>
      <Download className="size-4" aria-hidden="true" /> Show side as PNG
    </a>
  );
}

/** Undo and redo work wherever the focus is, except where something is typed. */
function useUndoKeys(): void {
  const actions = useTableActions();
  useEffect(() => {
    const pressed = (event: KeyboardEvent) => {
      const typed = event.target instanceof HTMLElement && event.target.closest("input, textarea, select, [role=dialog]");
      if (!typed && pressUndoKey(event, actions)) event.preventDefault();
    };
    window.addEventListener("keydown", pressed);
    return () => window.removeEventListener("keydown", pressed);
  }, [actions]);
}
