import { headers } from "next/headers";
import type { ReactNode } from "react";
import { UnitsProvider } from "@/components/shell/units";
import { pageAccess } from "@/lib/server/access";
import { shopSettings } from "@/lib/server/shops";

/** The bench has no navigation: one order fills the screen. */
export default async function BenchLayout({ children }: { children: ReactNode }) {
  const access = await pageAccess((await headers()).get("x-path") ?? "/orders");
  const { units, inchFraction, timeZone, currency } = await shopSettings(access.shopId);
  return (
    <UnitsProvider units={units} inchFraction={inchFraction} timeZone={timeZone} currency={currency}>
      {children}
    </UnitsProvider>
  );
}
