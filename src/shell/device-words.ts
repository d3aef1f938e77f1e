const PHONE_EDGE_MAX_PX = 600;

/** What people call the thing in front of them. */
export function deviceWord(): 'phone' | 'tablet' | 'computer' {
  if (!window.matchMedia('(pointer: coarse)').matches) return 'computer';
  return Math.min(window.screen.width, window.screen.height) < PHONE_EDGE_MAX_PX ? 'phone' : 'tablet';
}
