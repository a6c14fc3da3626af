"use client";
import Link from "next/link";
import { usePathname } from "next/navigation";
import type { Session } from "@/lib/schemas/session";
import { AccountMenu } from "./account-menu";
import { Mark } from "./mark";

const places = [
  { href: "/today", name: "Today" },
  { href: "/jobs", name: "Jobs" },
  { href: "/rack", name: "Rack" },
  { href: "/orders", name: "Cut orders" },
  { href: "/shop", name: "Shop" },
] as const;

export function TopBar({ session }: { session: Session }) {
  const path = usePathname();
  return (
    <header className="bg-graphite text-white print:hidden">
      <div className="flex flex-wrap items-center gap-x-6 px-4 md:h-13 md:flex-nowrap md:px-5">
        <Link href="/today" className="flex h-12 items-center gap-2 focus-visible:outline-tape">
          <Mark />
          <span className="font-measure text-xl font-semibold">Grainwright</span>
        </Link>
        <nav aria-label="Main" className="order-last -mx-4 w-[calc(100%+2rem)] overflow-x-auto md:order-none md:mx-0 md:w-auto">
          <ul className="flex px-2 md:px-0">
            {places.map(({ href, name }) => {
              const here = path === href || path.startsWith(`${href}/`);
              return (
                <li key={href}>
                  <Link
                    href={href}
                    aria-current={here ? "page" : undefined}
                    className={`block border-b-3 px-3 py-3 whitespace-nowrap focus-visible:-outline-offset-2 focus-visible:outline-tape ${here ? "border-tape" : "border-transparent text-[#d5dadb] hover:text-white"}`}
                  >
                    {name}
                  </Link>
                </li>
              );
            })}
          </ul>
        </nav>
        <div className="ml-auto">
          <AccountMenu session={session} />
        </div>
      </div>
    </header>
  );
}
