import { RouteStripTall } from "./route-strip-tall";
import { RouteStripWide } from "./route-strip-wide";
import { standingSentence, type Strip } from "./strip";

/** From which width so many hand-overs have room side by side; more than the last fit on no screen. */
const WIDTHS = [
  { most: 1, wide: "hidden sm:block", tall: "sm:hidden" },
  { most: 2, wide: "hidden md:block", tall: "md:hidden" },
  { most: 4, wide: "hidden lg:block", tall: "lg:hidden" },
];
const ALWAYS_TALL = { wide: "hidden", tall: "" };

/** The route as a strip of track: solid where the unit has been, broken ahead of it, a diamond where a carrier takes over. Down the page on a phone. */
export function RouteStrip({ label = "Route", className, ...strip }: Strip & { label?: string; className?: string }) {
  const count = strip.handovers.length;
  const { wide, tall } = WIDTHS.find(({ most }) => count <= most) ?? ALWAYS_TALL;
  return (
    <figure aria-label={label} className={className}>
      <figcaption className="sr-only">{standingSentence(strip)}</figcaption>
      <div className={wide}>
        <RouteStripWide {...strip} />
      </div>
      <div className={tall}>
        <RouteStripTall {...strip} />
      </div>
    </figure>
  );
}
