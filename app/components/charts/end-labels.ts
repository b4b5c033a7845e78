import { type ChartFrame, xOf, yOf } from "./chart-frame";
import type { Curve } from "./curve";

export interface EndLabel {
  id: string;
  family: string;
  text: string;
  /** The curve's last point. */
  x: number;
  y: number;
  /** Middle of the text. */
  labelY: number;
}

const lineHeight = 14;

/** Names beside the ends of the curves, moved apart where they would touch. */
export function endLabels(curves: readonly Curve[], frame: ChartFrame, useShort: boolean): EndLabel[] {
  const labels = curves.flatMap((curve): EndLabel[] => {
    const text = useShort ? curve.shortLabel : curve.label;
    const last = curve.points.at(-1);
    if (text === null || !last) return [];
    const [x, y] = [xOf(frame, last.nodesPerAxis), yOf(frame, last.error)];
    return [{ id: curve.id, family: curve.family, text, x, y, labelY: y }];
  });
  labels.sort((a, b) => a.y - b.y);
  return spread(labels, frame.height);
}

/** Blocks of touching labels are centred on their curves, then kept within the frame. */
function spread(labels: EndLabel[], height: number): EndLabel[] {
  const blocks: { members: EndLabel[]; middle: number }[] = [];
  for (const label of labels) {
    let block = { members: [label], middle: label.y };
    let above = blocks.at(-1);
    while (above && topOf(block) < bottomOf(above)) {
      blocks.pop();
      const members = [...above.members, ...block.members];
      block = { members, middle: members.reduce((sum, member) => sum + member.y, 0) / members.length };
      keepWithin(block, height);
      above = blocks.at(-1);
    }
    keepWithin(block, height);
    blocks.push(block);
  }
  return blocks.flatMap((block) =>
    block.members.map((label, index) => ({ ...label, labelY: topOf(block) + (index + 0.5) * lineHeight })),
  );
}

interface Block {
  members: EndLabel[];
  middle: number;
}

const halfOf = (block: Block) => (block.members.length * lineHeight) / 2;
const topOf = (block: Block) => block.middle - halfOf(block);
const bottomOf = (block: Block) => block.middle + halfOf(block);

function keepWithin(block: Block, height: number): void {
  const half = halfOf(block);
  block.middle = Math.max(half, Math.min(block.middle, Math.max(half, height - half)));
}
