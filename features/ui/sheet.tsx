import { type ReactNode, useCallback, useEffect, useId, useRef } from 'react';
import { createPortal } from 'react-dom';
import { View } from 'react-native';
import { Heading } from './heading';
import { useLayout } from './layout';
import { space } from './tokens';
import { useFocusTrap } from './use-focus-trap';

export interface SheetProps {
  open: boolean;
  onClose: () => void;
  title: ReactNode;
  children: ReactNode;
  /** Beside the title: "Clear all". */
  action?: ReactNode;
  /** Buttons at the foot; they stay in view. */
  footer?: ReactNode;
}

/** While a sheet is open the page behind it takes no focus and does not scroll. */
function useQuietPage(open: boolean): void {
  useEffect(() => {
    if (!open) return undefined;
    const root = document.getElementById('root');
    const { overflow } = document.body.style;
    root?.setAttribute('inert', '');
    document.body.style.overflow = 'hidden';
    return () => {
      root?.removeAttribute('inert');
      document.body.style.overflow = overflow;
    };
  }, [open]);
}

/** A sheet from below on a phone, a centred box elsewhere. Focus is trapped; Escape and a press beside it close. */
export function Sheet({ open, onClose, title, children, action, footer }: SheetProps) {
  const box = useRef<HTMLDivElement>(null);
  const titleId = useId();
  const phone = useLayout() === 'phone';
  const latestClose = useRef(onClose);
  useEffect(() => {
    latestClose.current = onClose;
  });
  const close = useCallback(() => latestClose.current(), []);
  useQuietPage(open);
  useFocusTrap(open, box, close);
  if (!open) return null;
  return createPortal(
    <div
      className={phone ? 'r-veil r-noprint' : 'r-veil r-centred r-noprint'}
      role="presentation"
      onMouseDown={(event) => {
        if (event.target === event.currentTarget) close();
      }}
    >
      <div ref={box} className="r-sheet" role="dialog" aria-modal="true" aria-labelledby={titleId} tabIndex={-1}>
        <View style={{ padding: space.two, paddingBottom: space.two, gap: space.two }}>
          <View
            style={{ flexDirection: 'row', justifyContent: 'space-between', alignItems: 'baseline', gap: space.two }}
          >
            <Heading level={2} id={titleId}>
              {title}
            </Heading>
            {action}
          </View>
          {children}
        </View>
        {footer ? <div className="r-sheet-foot">{footer}</div> : null}
      </div>
    </div>,
    document.body,
  );
}
