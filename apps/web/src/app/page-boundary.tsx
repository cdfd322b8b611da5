import { Component, type ErrorInfo, type ReactNode } from 'react';
import { faultTexts } from '../config/texts/shared.js';
import { ApiFault } from '../lib/api-fault.js';
import { Button } from '../ui/button.js';
import { Fault } from '../ui/fault.js';
import { Band } from '../ui/sheet.js';

interface Props {
  /** Another page clears the fault. */
  resetKey: string;
  children: ReactNode;
}

interface State {
  error: unknown;
  resetKey: string;
}

/** How the three browser engines word that a chunk named by an older page is gone. */
const chunkGone = /dynamically imported module|importing a module script failed|unable to preload/i;

function described(error: unknown): { title: string; detail?: string; requestId?: string } {
  if (error instanceof ApiFault) return error;
  return error instanceof Error && chunkGone.test(error.message)
    ? { title: faultTexts.shopChanged, detail: faultTexts.shopChangedDetail }
    : { title: faultTexts.somethingBroke, detail: faultTexts.somethingBrokeDetail };
}

/** Catches what a page throws, so that the header and the way out stay. */
export class PageBoundary extends Component<Props, State> {
  override state: State = { error: undefined, resetKey: this.props.resetKey };

  static getDerivedStateFromError(error: unknown) {
    return { error };
  }

  static getDerivedStateFromProps({ resetKey }: Props, state: State): State | null {
    return resetKey === state.resetKey ? null : { error: undefined, resetKey };
  }

  override componentDidCatch(error: Error, info: ErrorInfo) {
    console.error(error, info.componentStack);
  }

  override render() {
    if (this.state.error === undefined) return this.props.children;
    return (
      <Band>
        <Fault fault={described(this.state.error)} level={1}>
          <Button look="outline" size="sm" onClick={() => window.location.reload()}>
            {faultTexts.reload}
          </Button>
        </Fault>
      </Band>
    );
  }
}
