import { Component, type ReactNode } from 'react';

/** Keeps a part that fails to load or to draw from taking the whole screen, and its form, with it. */
export class CatchBoundary extends Component<
  { instead: ReactNode; children: ReactNode },
  { failed: boolean }
> {
  override state = { failed: false };

  static getDerivedStateFromError() {
    return { failed: true };
  }

  override render() {
    return this.state.failed ? this.props.instead : this.props.children;
  }
}
