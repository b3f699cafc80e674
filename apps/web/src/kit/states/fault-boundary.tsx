import { Component, type ReactElement, type ReactNode, Suspense } from "react";
import { FaultPanel } from "./fault-panel.tsx";
import { Loading } from "./loading.tsx";
import { problemFrom } from "./problem-words.ts";

export interface FaultBoundaryProps {
  children: ReactNode;
  /** Called before the part is drawn again, to forget what failed. */
  onRetry?: () => void;
}

/** Keeps the fault of one part of a page inside that part, says it there, and offers another try. */
export class FaultBoundary extends Component<FaultBoundaryProps, { fault: { error: unknown } | null }> {
  override state: { fault: { error: unknown } | null } = { fault: null };

  static getDerivedStateFromError(error: unknown): { fault: { error: unknown } } {
    return { fault: { error } };
  }

  override render(): ReactNode {
    if (this.state.fault === null) return this.props.children;
    return <FaultPanel problem={problemFrom(this.state.fault.error)} onRetry={() => this.retry()} />;
  }

  private retry(): void {
    this.props.onRetry?.();
    this.setState({ fault: null });
  }
}

/** A part of a page that comes and can fail on its own: its place while it comes, its fault where it stands. */
export function PagePart(props: FaultBoundaryProps & { label: string; rows?: number }): ReactElement {
  const { label, rows, ...boundary } = props;
  return (
    <FaultBoundary {...boundary}>
      <Suspense fallback={<Loading label={label} {...(rows !== undefined && { rows })} />}>
        {props.children}
      </Suspense>
    </FaultBoundary>
  );
}
