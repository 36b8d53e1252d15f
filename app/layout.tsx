import type { Metadata, Viewport } from "next";
import type { ReactNode } from "react";
import { Announcer } from "@/components/ui/announcer";
import { figuresFont, tapeFont, textFont } from "./fonts";
import "./globals.css";

export const metadata: Metadata = {
  title: { default: "Knockwire", template: "%s · Knockwire" },
  description: "Plans and checks the patches, songs and sets of home-made drum rigs.",
};

export const viewport: Viewport = { width: "device-width", initialScale: 1 };

export default function RootLayout({ children }: { children: ReactNode }) {
  return (
    <html lang="en-GB" className={`${textFont.variable} ${figuresFont.variable} ${tapeFont.variable}`}>
      <body className="flex min-h-dvh flex-col bg-floor text-ink">
        <a href="#main" className="sr-only focus:not-sr-only focus:absolute focus:left-3 focus:top-3 focus:z-50 focus:bg-mark focus:px-3 focus:py-2 focus:text-mark-ink">
          Skip to the page
        </a>
        <Announcer>{children}</Announcer>
      </body>
    </html>
  );
}
