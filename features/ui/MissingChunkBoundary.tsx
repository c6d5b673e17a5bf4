import { Component, type ReactNode } from "react";
import { View } from "react-native";
import { ErrorState } from "./ErrorState";

const storageKey = "larkspan-reloaded-at";
const oncePerMs = 30_000;
const patienceMs = 8000;

/** Whether an error says that a part of the program could not be fetched, as offline or after a new version was put in place. */
export function isMissingChunk(error: unknown): boolean {
  if (!(error instanceof Error)) return false;
  return (
    error.name === "AsyncRequireError" ||
    /loading (module|chunk|bundle)|dynamically imported module|load split bundle|unknown module/i.test(error.message)
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

/** Whether the page itself can be had: a reload without that leads out of the program, to the browser's own error page. */
async function pageAnswers(): Promise<boolean> {
  if (navigator.onLine === false) return false;
  const stop = new AbortController();
  const timer = setTimeout(() => stop.abort(), patienceMs);
  try {
    const { status } = await fetch(window.location.href, { method: "HEAD", cache: "no-store", signal: stop.signal });
    return status < 500;
  } catch {
    return false;
  } finally {
    clearTimeout(timer);
  }
}

export interface MissingChunkBoundaryProps {
  /** address of the page; another one gets a fresh try */
  path: string;
  reload?: () => void;
  children: ReactNode;
}

interface BoundaryState {
  error: Error | null;
  /** the page was asked for and did not answer */
  away: boolean;
}

/** Catches what breaks below it. A part that is missing after a new version is fetched by one reload, never while offline. */
export class MissingChunkBoundary extends Component<MissingChunkBoundaryProps, BoundaryState> {
  override state: BoundaryState = { error: null, away: false };

  static getDerivedStateFromError(error: Error) {
    return { error };
  }

  override componentDidCatch(error: Error) {
    if (isMissingChunk(error)) void this.reloadIf(() => mayReload(Date.now()));
  }

  override componentDidUpdate(before: MissingChunkBoundaryProps) {
    if (before.path !== this.props.path && this.state.error) this.setState({ error: null, away: false });
  }

  async reloadIf(allowed: () => boolean): Promise<void> {
    const broken = this.state.error;
    const answers = await pageAnswers();
    // Another page may have been opened meanwhile; that one is not to be reloaded.
    if (this.state.error !== broken) return;
    this.setState({ away: !answers });
    if (answers && allowed()) (this.props.reload ?? (() => window.location.reload()))();
  }

  override render() {
    const { error, away } = this.state;
    if (!error) return this.props.children;
    const missing = isMissingChunk(error);
    return (
      <View role="main" nativeID="main" style={{ padding: 24 }}>
        <ErrorState
          title={away ? "Larkspan cannot be reached" : missing ? "This page could not be fetched" : "This page broke"}
          text={
            away
              ? "This page was not opened before, so it has to be fetched. What you kept is safe, and the pages you had open still work. Try again when you are connected."
              : missing
                ? "The connection failed, or a new version was put in place. What you kept is safe. Load the page again."
                : "Something went wrong here that should not. What you kept is safe. Load the page again."
          }
          retryLabel={away ? "Try again" : "Load again"}
          onRetry={() => void this.reloadIf(() => true)}
        />
      </View>
    );
  }
}
