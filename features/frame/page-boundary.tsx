import { Component, type ReactNode } from 'react';
import { CrashPage } from '@/features/frame/crash-page';

interface PageBoundaryProps {
  /** Another page is another chance. */
  path: string;
  children: ReactNode;
}

/** Keeps the frame around a page that breaks, so that one can go on to another. */
export class PageBoundary extends Component<PageBoundaryProps, { error: Error | null }> {
  override state: { error: Error | null } = { error: null };

  static getDerivedStateFromError(error: unknown): { error: Error } {
    return { error: error instanceof Error ? error : new Error(String(error)) };
  }

  override componentDidUpdate(before: PageBoundaryProps): void {
    if (before.path !== this.props.path && this.state.error) this.setState({ error: null });
  }

  override render(): ReactNode {
    const { error } = this.state;
    return error ? <CrashPage error={error} retry={() => this.setState({ error: null })} /> : this.props.children;
  }
}
