import type { ReactNode } from "react";
import { coefficientAt, type Species } from "@/lib/layout";

interface Props {
  caption: string;
  species: readonly Species[];
  actions: ((key: string, name: string) => ReactNode) | null;
}

/** From 10 % the equation for shrinkage gives what tables of coefficients have. */
const AT_MOISTURE = 10;
const coefficient = (species: Species, ringAngle: number) =>
  coefficientAt(species.movement, ringAngle, AT_MOISTURE).toFixed(5).replace(/^0/, "");

/** Change per percent of moisture, radial and tangential, each row with its source. */
export function SpeciesTable({ caption, species, actions }: Props) {
  return (
    // biome-ignore lint/a11y/noNoninteractiveTabindex: a box that scrolls sideways on a phone has to be reached by keyboard.
    <section className="overflow-x-auto" aria-label={caption} tabIndex={0}>
      <table className="w-full min-w-xl text-left text-sm">
        <caption className="sr-only">{caption}</caption>
        <thead className="text-pencil">
          <tr className="border-b border-rule">
            <th scope="col" className="py-2 pr-4 font-normal">
              Species
            </th>
            <th scope="col" className="py-2 pr-4 text-right font-normal">
              Radial, per %
            </th>
            <th scope="col" className="py-2 pr-4 text-right font-normal">
              Tangential, per %
            </th>
            <th scope="col" className="py-2 pr-4 font-normal">
              From
            </th>
            {actions && (
              <th scope="col">
                <span className="sr-only">Change</span>
              </th>
            )}
          </tr>
        </thead>
        <tbody>
          {species.map((one) => (
            <tr key={one.key} className="border-b border-rule align-baseline">
              <th scope="row" className="py-1.5 pr-4 font-normal">
                {one.name}
                {one.alsoCalled.length > 0 && <span className="block text-pencil">{one.alsoCalled.join(", ")}</span>}
              </th>
              <td className="measure pr-4 text-right text-base">{coefficient(one, 90)}</td>
              <td className="measure pr-4 text-right text-base">{coefficient(one, 0)}</td>
              <td className="py-1.5 pr-4">
                {one.source.text}
                {one.movement.kind === "shrinkage" && (
                  <span className="block text-pencil">
                    Worked out from shrinkage of {one.movement.radial} and {one.movement.tangential} %, here at {AT_MOISTURE} %
                  </span>
                )}
              </td>
              {actions && <td className="py-1">{actions(one.key, one.name)}</td>}
            </tr>
          ))}
        </tbody>
      </table>
    </section>
  );
}
