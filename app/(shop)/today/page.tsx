import type { Metadata } from "next";
import Link from "next/link";
import type { ReactNode } from "react";
import { Lately } from "@/components/today/lately";
import { OrdersAtBench } from "@/components/today/orders-at-bench";
import { buttonClass } from "@/components/ui/button";
import { PageTitle } from "@/components/ui/page-title";
import { pageAccess } from "@/lib/server/access";
import { readHistory } from "@/lib/server/history";
import { readJobs } from "@/lib/server/jobs/jobs";
import { orderPage } from "@/lib/server/orders/read-orders";
import { readLoosePhotos } from "@/lib/server/photos/photos";
import { dayText } from "@/lib/words/day";

export const metadata: Metadata = { title: "Today" };

/** What waits for somebody, and what was done lately. */
export default async function TodayPage() {
  const access = await pageAccess("/today");
  const [orders, jobs, photos, rows] = await Promise.all([
    orderPage(access.shopId, { state: "issued", page: 1, pageSize: 6 }),
    readJobs(access, { state: "open", search: "", page: 1, pageSize: 6 }),
    readLoosePhotos(access, 100),
    readHistory(access.shopId, { limit: 60 }),
  ]);
  return (
    <>
      <PageTitle title="Today">
        <Link href="/rack/take-in" className={buttonClass("primary")}>
          {access.role === "assistant" ? "Add photographs" : "Take in wood"}
        </Link>
      </PageTitle>
      <div className="grid gap-8 p-4 md:p-5 lg:grid-cols-[minmax(0,1fr)_minmax(0,26rem)]">
        <div className="flex flex-col gap-8">
          <Section title="At the bench" more={{ href: "/orders", text: "All cut orders" }}>
            {orders.items.length > 0 ? (
              <OrdersAtBench orders={orders.items} />
            ) : (
              <p className="text-pencil">No cut order is open. Issue one from a layout.</p>
            )}
          </Section>
          <Section title="Open jobs" more={{ href: "/jobs", text: "All jobs" }}>
            {jobs.items.length === 0 && (
              <p className="text-pencil">No job is open. A job holds the faces you lay out on boards.</p>
            )}
            <ul className="divide-y divide-rule">
              {jobs.items.map((job) => (
                <li key={job.id} className="flex flex-wrap items-baseline justify-between gap-x-4 py-2.5">
                  <Link href={`/jobs/${job.id}`} className="font-semibold text-chalk underline-offset-4 hover:underline">
                    {job.title}
                  </Link>
                  <span className="text-sm text-pencil">
                    {[job.client, job.dueOn && `due ${dayText(job.dueOn)}`].filter(Boolean).join(" · ")}
                  </span>
                </li>
              ))}
            </ul>
          </Section>
          {photos.length > 0 && (
            <Section title="Photographs waiting to be marked">
              <p>
                <Link href="/rack/take-in" className="text-chalk underline">
                  {photos.length === 1 ? "One photograph" : `${photos.length} photographs`}
                </Link>{" "}
                taken in and not yet used for a board.
              </p>
            </Section>
          )}
        </div>
        <Section title="Lately">
          <Lately rows={rows} />
        </Section>
      </div>
    </>
  );
}

function Section({
  title,
  more,
  children,
}: {
  title: string;
  more?: { href: "/orders" | "/jobs"; text: string };
  children: ReactNode;
}) {
  return (
    <section>
      <div className="mb-2 flex items-baseline justify-between gap-4">
        <h2 className="text-xl">{title}</h2>
        {more && (
          <Link href={more.href} className="text-sm text-chalk underline-offset-4 hover:underline">
            {more.text}
          </Link>
        )}
      </div>
      {children}
    </section>
  );
}
