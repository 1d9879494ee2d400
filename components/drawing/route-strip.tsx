import { clsx } from "clsx";
import { RouteStripTall } from "./route-strip-tall";
import { RouteStripWide } from "./route-strip-wide";
import { standingSentence, type Strip } from "./strip";

/** More hand-overs than this do not fit side by side on any screen. */
const MOST_ACROSS = 4;

/** The route as a strip of track: solid where the unit has been, broken ahead of it, a diamond where a carrier takes over. Down the page on a phone. */
export function RouteStrip({ label = "Route", className, ...strip }: Strip & { label?: string; className?: string }) {
  const count = strip.handovers.length;
  const wide = count > MOST_ACROSS ? "hidden" : count > 2 ? "hidden lg:block" : "hidden sm:block";
  const tall = count > MOST_ACROSS ? "" : count > 2 ? "lg:hidden" : "sm:hidden";
  return (
    <figure aria-label={label} className={className}>
      <figcaption className="sr-only">{standingSentence(strip)}</figcaption>
      <div className={wide}>
        <RouteStripWide {...strip} />
      </div>
      <div className={clsx(tall)}>
        <RouteStripTall {...strip} />
      </div>
    </figure>
  );
}
