import { temperColour } from "@beadroll/domain/quality/temper";
import { memo, type ReactElement, useEffect, useRef } from "react";
import { ripplePath, type StripCommand } from "./bead-strip-drawing.ts";

interface PictureProps {
  commands: readonly StripCommand[];
  width: number;
  height: number;
}

/** Half of it lies under the ripples, half outside them. */
const OUTLINE_PX = 1.7;

/** All ripples as one path: drawn first and wider, it stays as the bead's outline, 3:1 against the ground. */
function beadOutline(commands: readonly StripCommand[]): string {
  return commands.map((command) => (command.kind === "ripple" ? ripplePath(command) : "")).join("");
}

/** The strip as SVG: crisp at any zoom, and on paper as wide as its place there. */
export const StripSvg = memo(function StripSvg({ commands, width, height }: PictureProps): ReactElement {
  return (
    <svg
      aria-hidden="true"
      viewBox={`0 0 ${width} ${height}`}
      preserveAspectRatio="none"
      className="absolute inset-0 size-full overflow-visible"
    >
      <path d={beadOutline(commands)} fill="none" stroke="var(--bead-outline)" strokeWidth={OUTLINE_PX} />
      {commands.map((command) =>
        command.kind === "gap" ? (
          <rect
            key={`gap ${command.x}`}
            x={command.x}
            y={command.y}
            width={command.width}
            height={command.height}
            rx="1"
            fill="none"
            stroke="var(--bead-outline)"
            strokeDasharray="3 2.5"
          />
        ) : (
          <path
            key={command.station}
            d={ripplePath(command)}
            fill={temperColour(command.share)}
            stroke="var(--ripple-line)"
            strokeWidth={command.partial ? 1.2 : 0.7}
            strokeDasharray={command.partial ? "2 2" : undefined}
          />
        ),
      )}
    </svg>
  );
});

/** The same strip on a canvas, where SVG would need too many elements. */
export const StripCanvas = memo(function StripCanvas({
  commands,
  width,
  height,
}: PictureProps): ReactElement {
  const canvas = useRef<HTMLCanvasElement>(null);
  // A canvas is painted, not rendered; it is painted again when the theme changes its colours.
  useEffect(() => {
    const element = canvas.current;
    if (element === null) return undefined;
    const paint = () => paintStrip(element, { commands, width, height });
    paint();
    const dark = matchMedia("(prefers-color-scheme: dark)");
    const observer = new MutationObserver(paint);
    observer.observe(document.documentElement, { attributeFilter: ["data-theme"] });
    dark.addEventListener("change", paint);
    return () => {
      observer.disconnect();
      dark.removeEventListener("change", paint);
    };
  }, [commands, width, height]);
  return (
    <canvas
      ref={canvas}
      className="absolute inset-0 size-full text-bead-outline"
      style={{ outlineColor: "var(--ripple-line)" }}
    />
  );
});

function paintStrip(canvas: HTMLCanvasElement, { commands, width, height }: PictureProps): void {
  const scale = devicePixelRatio;
  canvas.width = Math.round(width * scale);
  canvas.height = Math.round(height * scale);
  const context = canvas.getContext("2d");
  if (context === null) return;
  const style = getComputedStyle(canvas);
  context.scale(scale, scale);
  context.strokeStyle = style.color;
  context.lineWidth = OUTLINE_PX;
  context.stroke(new Path2D(beadOutline(commands)));
  for (const command of commands) {
    if (command.kind === "gap") {
      context.strokeStyle = style.color;
      context.lineWidth = 1;
      context.setLineDash([3, 2.5]);
      context.strokeRect(command.x, command.y, command.width, command.height);
      continue;
    }
    const path = new Path2D(ripplePath(command));
    context.fillStyle = temperColour(command.share);
    context.fill(path);
    context.strokeStyle = style.outlineColor;
    context.lineWidth = command.partial ? 1.2 : 0.7;
    context.setLineDash(command.partial ? [2, 2] : []);
    context.stroke(path);
  }
}
