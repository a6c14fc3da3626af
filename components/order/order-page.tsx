"use client";
/** One order for the maker: what was issued, what the bench has done, and everything to print. */
import { useQuery } from "@tanstack/react-query";
import Link from "next/link";
import { useEffect } from "react";
import { messageOf } from "@/lib/client/fault-from-server";
import { orderPdfUrl, orderQuery, progressQuery } from "@/lib/client/order";
import type { Order } from "@/lib/schemas/order";
import { orderSteps, takesWood } from "@/lib/schemas/order-steps";
import { revisionLetter } from "@/lib/words/revision-letter";
import { supersededWhy } from "@/lib/words/superseded";
import { buttonClass } from "../ui/button";
import { Notice } from "../ui/notice";
import { PageTitle } from "../ui/page-title";
import type { BenchQr } from "./bench-code";
import { BenchCode } from "./bench-code";
import { FaceView } from "./face-view";
import { LabelForm } from "./label-form";
import { OrderRevisions } from "./order-revisions";
import { OrderStepsTable } from "./order-steps-table";
import { RestPanel } from "./rest-panel";
import { RestRecord } from "./rest-record";
import { ShopDate } from "./shop-date";
import { StepTape } from "./step-tape";

interface Props {
  initial: Order;
  /** The revision asked for in the address; undefined: the newest. */
  revision: number | undefined;
  paper: "a4" | "letter";
  qr: BenchQr;
  /** Whether who looks may issue. */
  mayIssue: boolean;
}

export function OrderPage({ initial, revision, paper, qr, mayIssue }: Props) {
  const { data: order, error: orderError, refetch } = useQuery({ ...orderQuery(initial.id, revision), initialData: initial });
  const { data: progress, error: progressError } = useQuery({
    ...progressQuery(order.id, order.revisionId),
    initialData: {
      ticks: order.ticks,
      asCut: order.asCut,
      superseded: order.superseded,
      newestRevision: order.revisions[0]?.revision ?? order.revision,
    },
  });
  // A revision issued meanwhile brings another snapshot and another list of revisions.
  const known = order.revisions[0]?.revision;
  useEffect(() => {
    if (progress.newestRevision !== known) refetch();
  }, [progress.newestRevision, known, refetch]);

  const ticks = new Map(progress.ticks.map((tick) => [tick.stepId, tick]));
  const steps = orderSteps(order.snapshot);
  const done = steps.map(({ id }) => ticks.has(id));
  const next = done.indexOf(false);
  const letter = revisionLetter(order.revision);
  const isNewest = order.revision === progress.newestRevision;
  const isCutInto = order.snapshot.boards.some(({ tag }) => progress.ticks.some(({ stepId }) => takesWood(stepId, tag)));
  const hasRest = isNewest && (progress.asCut.length > 0 || (progress.superseded && isCutInto));
  const connectionError = progressError ?? orderError;
  const pdf = (size: "a4" | "letter") => orderPdfUrl(order.id, { paper: size, revision: order.revision });
  return (
    <>
      <PageTitle
        title={`Cut order ${order.number} ${letter}`}
        above={
          <Link href={`/jobs/${order.jobId}`} className="text-chalk underline">
            {order.jobTitle}
          </Link>
        }
      >
        <a href={pdf("a4")} className={buttonClass(paper === "a4" ? "primary" : "plain")}>
          Print on A4
        </a>
        <a href={pdf("letter")} className={buttonClass(paper === "letter" ? "primary" : "plain")}>
          Print on Letter
        </a>
        <Link href={`/bench/${order.id}`} className={buttonClass("plain")}>
          Open the bench
        </Link>
      </PageTitle>
      <StepTape steps={steps.length} done={done} at={next < 0 || progress.superseded ? null : next} />
      <div className="grid items-start gap-5 p-4 md:p-5 lg:grid-cols-[minmax(0,1fr)_20rem]">
        <div className="flex min-w-0 flex-col gap-4">
          {connectionError && (
            <Notice kind="care">
              {messageOf(connectionError)} What you see may be old: what others do is not shown until then.
            </Notice>
          )}
          {progress.superseded && <Superseded order={order} newest={progress.newestRevision} begun={isCutInto} />}
          {next < 0 && <Notice kind="sound">Every step is ticked.</Notice>}
          {hasRest && <RestPanel order={order} progress={progress} mayIssue={mayIssue} />}
          <RestRecord order={order} />
          <OrderStepsTable order={order} steps={steps} ticks={ticks} />
        </div>
        <aside className="flex flex-col gap-6">
          {order.snapshot.faces.map(({ faceId, title, layout, layoutRevision }) => (
            <section key={faceId}>
              <h2 className="mb-2 text-lg">
                <Link href={`/jobs/${order.jobId}/faces/${faceId}`} className="text-chalk underline">
                  {title}
                </Link>
              </h2>
              <FaceView layout={layout} title={title} />
              <p className="mt-1 text-sm text-pencil">Made from layout {layoutRevision}</p>
            </section>
          ))}
          <BenchCode qr={qr} />
          <LabelForm orderId={order.id} revision={order.revision} paper={paper} />
          <OrderRevisions order={order} />
          <p className="text-sm break-all text-pencil">
            Issued <ShopDate at={order.issuedAt} /> by {order.issuedBy}. Fingerprint {order.fingerprint.slice(0, 12)}
          </p>
        </aside>
      </div>
    </>
  );
}

function Superseded({ order, newest, begun }: { order: Order; newest: number; begun: boolean }) {
  return (
    <Notice kind="stop">
      Revision {revisionLetter(order.revision)} is superseded: {supersededWhy}.{" "}
      {newest > order.revision ? (
        <Link href={`/orders/${order.id}`} className="text-chalk underline">
          Go to revision {revisionLetter(newest)}
        </Link>
      ) : (
        `Issue ${begun ? "the rest" : "the layout again"} before anything more is cut.`
      )}
    </Notice>
  );
}
