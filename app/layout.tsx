import type { Metadata, Viewport } from "next";
import { type ReactNode } from "react";
import { archivo, plexMono, sairaStencil } from "./fonts";
import "./globals.css";

export const metadata: Metadata = {
  title: { default: "Towfolio", template: "%s · Towfolio" },
  description: "One case file for a locomotive that goes by rail dead in tow.",
  robots: { index: false, follow: false },
  formatDetection: { telephone: false, date: false, address: false, email: false },
};

export const viewport: Viewport = { colorScheme: "light dark", width: "device-width", initialScale: 1 };

export default function RootLayout({ children }: { children: ReactNode }) {
  return (
    <html lang="en-US" className={`${archivo.variable} ${plexMono.variable} ${sairaStencil.variable}`}>
      <body>{children}</body>
    </html>
  );
}
