"use client";
/** The steps as on paper, with who ticked them and when. */
import { mmFromUm, printedLength } from "@/lib/layout";
import type { Order } from "@/lib/schemas/order";
import type { OrderStep } from "@/lib/schemas/order-steps";
import { type Gives, stepWords, styleOf } from "@/lib/words/order-step";
import { woodCheck } from "@/lib/words/wood-check";
import { WhoAndWhen } from "./who-and-when";
import { WoodView } from "./wood-view";

interface Props {
  order: Order;
  steps: readonly OrderStep[];
  ticks: ReadonlyMap<string, Order["ticks"][number]>;
}

export function OrderStepsTable({ order, steps, ticks }: Props) {
  const { snapshot } = order;
  const style = styleOf(snapshot);
  return snapshot.boards.map((board) => (
    <section key={board.boardId} className="min-w-0">
      <h2 className="mb-2 text-lg">
        Board {board.tag}, {board.species}
        {board.place && `, ${board.place}`}
      </h2>
      <WoodView
        snapshot={snapshot}
        board={board}
        window={{ x: 0, y: 0, width: mmFromUm(board.length), height: mmFromUm(board.width) }}
        label={`Board ${board.tag} with its fronts`}
        className="mb-2 max-h-72"
      />
      <div className="overflow-x-auto">
        <table className="w-full text-sm">
          <thead>
            <tr className="border-b border-graphite text-left text-pencil">
              <th className="py-1.5 pr-2 font-normal" scope="col">
                <span className="sr-only">Step</span>
              </th>
              <th className="py-1.5 pr-3 font-normal" scope="col">
                Do this
              </th>
              <th className="hidden py-1.5 pr-3 font-normal sm:table-cell" scope="col">
                From
              </th>
              <th className="py-1.5 pr-3 text-right font-normal whitespace-nowrap" scope="col">
                Setting, {style.unit === "mm" ? "mm" : "in"}
              </th>
              <th className="hidden py-1.5 pr-3 font-normal md:table-cell" scope="col">
                Gives, {style.unit === "mm" ? "mm" : "in"}
              </th>
              <th className="hidden py-1.5 font-normal sm:table-cell" scope="col">
                Done
              </th>
            </tr>
          </thead>
          <tbody>
            {steps.map((step, i) => {
              if (step.board !== board) return null;
              const words = stepWords(step, style, steps[i - 1]);
              const tick = ticks.get(step.id);
              return (
                <tr key={step.id} className={`border-b border-rule align-top ${tick ? "bg-moss-wash" : ""}`}>
                  <td className="measure py-2 pr-2 pl-1 text-right text-base">{step.number}</td>
                  <td className="py-2 pr-3">
                    <b>{words.verb}</b> {words.rest}
                    {[...words.notes, ...words.cautions].map((note) => (
                      <span key={note} className="block text-pencil">
                        {note}
                      </span>
                    ))}
                    <span className="block md:hidden">
                      <GivesList gives={words.gives} />
                    </span>
                    {tick && (
                      <span className="block text-moss sm:hidden">
                        Done: <WhoAndWhen tick={tick} />
                      </span>
                    )}
                  </td>
                  <td className="hidden py-2 pr-3 sm:table-cell">{words.from}</td>
                  <td className="measure py-2 pr-3 text-right text-lg leading-5 whitespace-nowrap">
                    {words.setting === null ? "" : printedLength(words.setting, style).figure}
                  </td>
                  <td className="hidden py-2 pr-3 md:table-cell">
                    <GivesList gives={words.gives} />
                  </td>
                  <td className="hidden py-2 pr-1 text-moss sm:table-cell">{tick && <WhoAndWhen tick={tick} />}</td>
                </tr>
              );
            })}
          </tbody>
        </table>
      </div>
      <div className="mt-2 text-sm text-pencil">
        {woodCheck(board, style).map((line) => (
          <p key={line}>{line}</p>
        ))}
      </div>
    </section>
  ));
}

function GivesList({ gives }: { gives: readonly Gives[] }) {
  const told = gives.filter(({ label, size }) => label !== null || size !== null);
  return told.map(({ word, label, size }) => (
    <span key={`${word} ${label}`} className="measure block whitespace-nowrap">
      {word && <span className="font-sans font-normal">{word} </span>}
      {label && <span className="mr-1.5 inline-block min-w-5 border border-graphite px-1 text-center leading-4">{label}</span>}
      {size}
    </span>
  ));
}
