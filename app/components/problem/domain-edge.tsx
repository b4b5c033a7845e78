import type { EdgeKind } from "./domain-figure";

type Side = "left" | "right" | "top" | "bottom";

const line = { stroke: "var(--ink)", fill: "none" };

/** One end of the domain, drawn in a strip of 16 px that its side fills; x grows outward. */
export function Edge({ kind, side }: { kind: EdgeKind; side: Side }) {
  const id = `edge-${side}`;
  const isUpright = side === "left" || side === "right";
  return (
    <svg
      className={`edge edge-${side}`}
      aria-hidden="true"
      width={isUpright ? 16 : "100%"}
      height={isUpright ? "100%" : 16}
    >
      <defs>
        <pattern id={id} width="16" height="12" patternUnits="userSpaceOnUse" patternTransform={turns[side]}>
          <Sign kind={kind} />
        </pattern>
      </defs>
      <rect width="100%" height="100%" fill={`url(#${id})`} />
    </svg>
  );
}

/** The signs are drawn for a right-hand end. */
const turns: Record<Side, string> = {
  right: "",
  left: "translate(16 0) scale(-1 1)",
  top: "translate(0 16) rotate(-90)",
  bottom: "rotate(90) scale(1 -1)",
};

function Sign({ kind }: { kind: EdgeKind }) {
  switch (kind) {
    case "dirichlet":
      return (
        <>
          <path d="M1.5 0V12" {...line} strokeWidth="3" />
          <path d="M3 6L9 0M3 12L15 0M9 12L15 6" {...line} strokeWidth="0.9" />
        </>
      );
    case "neumann":
      return <path d="M1 0V12M5 0V12" {...line} strokeWidth="1.5" />;
    case "robin":
      return (
        <>
          <path d="M1 0V12" {...line} strokeWidth="1.5" />
          <path d="M1 0L9 3L1 6L9 9L1 12" {...line} strokeWidth="1.3" />
        </>
      );
    case "periodic":
      return (
        <>
          <path d="M1 0V8" {...line} strokeWidth="1.5" />
          <path d="M4 3L9 6L4 9" {...line} strokeWidth="0.9" opacity="0.45" />
        </>
      );
    case "none":
      return <path d="M0.5 0V12" {...line} strokeWidth="1" />;
  }
}
