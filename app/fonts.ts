/** The two families: words, and narrow for titles and measures. They ship with the project. */
import localFont from "next/font/local";

export const words = localFont({
  src: "../public/fonts/atkinson-hyperlegible-next-latin.woff2",
  weight: "200 800",
  variable: "--font-words",
  display: "swap",
});

export const narrow = localFont({
  src: "../public/fonts/sofia-sans-condensed-latin.woff2",
  weight: "1 1000",
  variable: "--font-narrow",
  display: "swap",
});
