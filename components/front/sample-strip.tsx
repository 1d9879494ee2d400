import { MarkStencil } from "@/components/drawing/mark-stencil";
import { RouteStrip } from "@/components/drawing/route-strip";
import { positionOf, type Strip } from "@/components/drawing/strip";
import { Box, BoxGrid } from "@/components/ui/box";

const STRIP: Strip = {
  ends: { from: { name: "Sand Hollow elevator", note: "Sand Hollow" }, to: { name: "Vellum Ridge shops", note: "Quill Creek" } },
  handovers: [
    { id: "first", carrier: "Quillan & Sandbar", place: "Sand Hollow", note: "Taken over", tone: "met", leg: "ZQSR, 174 mi" },
    { id: "second", carrier: "Sable Mountain Lines", place: "Ardell", note: "4 of 5 conditions met", tone: "waiting", leg: "ZSML, 210 mi" },
  ],
  position: positionOf({ count: 2, passed: 1, along: 0.5 }),
  unit: { shape: "hood", axles: 6 },
};

/** A move as its case file draws it; everything in it is invented. */
export function SampleStrip() {
  return (
    <figure>
      <div className="border border-rule-strong bg-sheet lg:grid lg:grid-cols-[300px_minmax(0,1fr)]">
        <div className="flex flex-col justify-between gap-3 border-b border-rule-strong px-4 pt-4 pb-3.5 sm:px-5 lg:border-r lg:border-b-0">
          <p className="lab">Case 26-0041 · dead in tow</p>
          <p>
            <MarkStencil mark="ZVRX" number="2783" size="head" />
          </p>
        </div>
        <BoxGrid framed={false}>
          <Box label="From" span={3} detail="Sand Hollow">
            Sand Hollow elevator
          </Box>
          <Box label="To" span={3} detail="Quill Creek">
            Vellum Ridge shops
          </Box>
          <Box label="Tow speed" span={3} mono detail="at most">
            25 mph
          </Box>
          <Box label="Waiting on" span={3} tone="waiting" detail="4 days, to look at 2 answers">
            Sable Mountain Lines, inspector
          </Box>
        </BoxGrid>
      </div>
      <div className="border border-t-0 border-rule-strong bg-sheet px-4 py-4 sm:px-12 sm:pb-6">
        <RouteStrip {...STRIP} label="Route of an invented move" />
      </div>
      <figcaption className="mt-1.5 text-13 text-ink-2 max-sm:text-14">The head of a case file. Unit, places and companies are invented.</figcaption>
    </figure>
  );
}
