import { headers } from "next/headers";
import type { ReactNode } from "react";
import { TopBar } from "@/components/shell/top-bar";
import { UnitsProvider } from "@/components/shell/units";
import { pageAccess } from "@/lib/server/access";
import { sessionOf } from "@/lib/server/sessions";
import { shopSettings } from "@/lib/server/shops";

/** Everything behind the session gate. */
export default async function ShopLayout({ children }: { children: ReactNode }) {
  const access = await pageAccess((await headers()).get("x-path") ?? "/today");
  const { units, inchFraction, timeZone, currency } = await shopSettings(access.shopId);
  return (
    <UnitsProvider units={units} inchFraction={inchFraction} timeZone={timeZone} currency={currency}>
      <TopBar session={sessionOf(access)} />
      <main>{children}</main>
    </UnitsProvider>
  );
}
