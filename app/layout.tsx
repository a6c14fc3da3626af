import type { Metadata, Viewport } from "next";
import { connection } from "next/server";
import type { ReactNode } from "react";
import { Providers } from "@/components/shell/providers";
import { narrow, words } from "./fonts";
import "./globals.css";

export const metadata: Metadata = { title: { default: "Grainwright", template: "%s · Grainwright" } };
export const viewport: Viewport = { width: "device-width", initialScale: 1, themeColor: "#20262a" };

export default async function RootLayout({ children }: { children: ReactNode }) {
  // Every page is made for its request: the scripts' nonce is.
  await connection();
  return (
    <html lang="en" className={`${words.variable} ${narrow.variable}`}>
      <body className="min-h-dvh">
        <Providers>{children}</Providers>
      </body>
    </html>
  );
}
