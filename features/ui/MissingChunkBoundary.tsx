import { Component, type ReactNode } from "react";
import { View } from "react-native";
import { ErrorState } from "./ErrorState";

const storageKey = "larkspan-reloaded-at";
const oncePerMs = 30_000;

/** Whether an error says that a part of the program could not be fetched, as after a new version was put in place. */
export function isMissingChunk(error: unknown): boolean {
  if (!(error instanceof Error)) return false;
  return (
    error.name === "AsyncRequireError" ||
    /loading (module|chunk|bundle)|dynamically imported module|load split bundle/i.test(error.message)
  );
}

function mayReload(now: number): boolean {
  try {
    const last = Number(window.sessionStorage.getItem(storageKey) ?? 0);
    if (now - last < oncePerMs) return false;
    window.sessionStorage.setItem(storageKey, String(now));
    return true;
  } catch {
    return false;
  }
}

export interface MissingChunkBoundaryProps {
  /** address of the page; another one gets a fresh try */
  path: string;
  children: ReactNode;
}

/** Catches what breaks below it. A part that is missing after a new version is fetched by one reload. */
export class MissingChunkBoundary extends Component<MissingChunkBoundaryProps, { error: Error | null }> {
  override state: { error: Error | null } = { error: null };

  static getDerivedStateFromError(error: Error) {
    return { error };
  }

  override componentDidCatch(error: Error) {
    if (isMissingChunk(error) && mayReload(Date.now())) window.location.reload();
  }

  override componentDidUpdate(before: MissingChunkBoundaryProps) {
    if (before.path !== this.props.path && this.state.error) this.setState({ error: null });
  }

  override render() {
    if (!this.state.error) return this.props.children;
    const missing = isMissingChunk(this.state.error);
    return (
      <View role="main" nativeID="main" style={{ padding: 24 }}>
        <ErrorState
          title={missing ? "This page could not be fetched" : "This page broke"}
          text={
            missing
              ? "The connection failed, or a new version was put in place. What you kept is safe. Load the page again."
              : "Something went wrong here that should not. What you kept is safe. Load the page again."
          }
          retryLabel="Load again"
          onRetry={() => window.location.reload()}
        />
      </View>
    );
  }
}
