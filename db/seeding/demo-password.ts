/** Shown openly: it guards invented data only. */
export const DEMO_PASSWORD = 'northbank-demo';
