import localFont from "next/font/local";

/** Fonts ship with the application; all three families are under the SIL Open Font License. */
export const textFont = localFont({
  src: [
    { path: "../node_modules/@fontsource/atkinson-hyperlegible-next/files/atkinson-hyperlegible-next-latin-400-normal.woff2", weight: "400" },
    { path: "../node_modules/@fontsource/atkinson-hyperlegible-next/files/atkinson-hyperlegible-next-latin-600-normal.woff2", weight: "600" },
    { path: "../node_modules/@fontsource/atkinson-hyperlegible-next/files/atkinson-hyperlegible-next-latin-700-normal.woff2", weight: "700" },
  ],
  variable: "--font-text",
  display: "swap",
});

export const figuresFont = localFont({
  src: [
    { path: "../node_modules/@fontsource/atkinson-hyperlegible-mono/files/atkinson-hyperlegible-mono-latin-400-normal.woff2", weight: "400" },
    { path: "../node_modules/@fontsource/atkinson-hyperlegible-mono/files/atkinson-hyperlegible-mono-latin-700-normal.woff2", weight: "700" },
  ],
  variable: "--font-figures",
  display: "swap",
});

export const tapeFont = localFont({
  src: [
    { path: "../node_modules/@fontsource/sofia-sans-extra-condensed/files/sofia-sans-extra-condensed-latin-700-normal.woff2", weight: "700" },
    { path: "../node_modules/@fontsource/sofia-sans-extra-condensed/files/sofia-sans-extra-condensed-latin-800-normal.woff2", weight: "800" },
  ],
  variable: "--font-tape",
  display: "swap",
});
