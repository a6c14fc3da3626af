import type { Metadata } from "next";
import { MovementSettingsForm } from "@/components/movement/movement-settings-form";
import { SpeciesList } from "@/components/movement/species-list";
import { Saws } from "@/components/shop/saws";
import { ShopForm } from "@/components/shop/shop-form";
import { PageTitle } from "@/components/ui/page-title";
import { pageAccess } from "@/lib/server/access";
import { movementSettings } from "@/lib/server/movement/settings";
import { shopSettings } from "@/lib/server/shops";
import { ownSpecies } from "@/lib/server/species";

export const metadata: Metadata = { title: "Shop" };

export default async function ShopPage() {
  const access = await pageAccess("/shop");
  const shop = await shopSettings(access.shopId);
  const movement = await movementSettings(access.shopId);
  const species = await ownSpecies(access.shopId);
  return (
    <>
      <PageTitle title="Shop" />
      <div className="flex flex-col gap-10 p-4 md:p-5">
        <Saws initial={shop} mayEdit={access.role !== "assistant"} />
        <section aria-labelledby="settings">
          <h2 id="settings" className="mb-3 text-xl">
            Settings
          </h2>
          <ShopForm shop={shop} mayEdit={access.role === "owner"} />
        </section>
        <section aria-labelledby="movement">
          <h2 id="movement" className="mb-3 text-xl">
            Movement of wood
          </h2>
          <MovementSettingsForm initial={movement} mayEdit={access.role === "owner"} />
        </section>
        <SpeciesList initial={species} mayEdit={access.role !== "assistant"} />
      </div>
    </>
  );
}
