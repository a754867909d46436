import { Component } from 'react';
import type { ReactNode } from 'react';
import { useLocation } from 'react-router';
import { PageFault } from './not-found.tsx';

/** Shows a page that broke or could not be fetched as what it is; another address is a new try. */
export function PageBoundary({ children }: { children: ReactNode }) {
  return <Boundary address={useLocation().key}>{children}</Boundary>;
}

interface Props {
  address: string;
  children: ReactNode;
}
interface State {
  error: unknown;
  address: string;
}

class Boundary extends Component<Props, State> {
  override state: State = { error: null, address: this.props.address };

  static getDerivedStateFromError(error: unknown): Partial<State> {
    return { error };
  }

  static getDerivedStateFromProps({ address }: Props, state: State): Partial<State> | null {
    return address === state.address ? null : { error: null, address };
  }

  override render() {
    return this.state.error === null ? this.props.children : <PageFault error={this.state.error} />;
  }
}
