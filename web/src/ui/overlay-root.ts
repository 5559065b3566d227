import { createContext, use } from 'react';

/**
 * Where drawers, dialogs and menus are put. It lies inside the part of the page that the idle cover hides,
 * so that nothing opened over the page stays readable.
 */
export const OverlayRootContext = createContext<HTMLElement | null>(null);

export const useOverlayRoot = (): HTMLElement | null => use(OverlayRootContext);
