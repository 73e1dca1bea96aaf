/** Worksheets that a step may ask for, and what each is called on a sheet. */
export const WORKSHEETS = {
  readings: 'Readings',
  units: 'Units',
  clamp: 'Clamp check',
  'wrench-adapter': 'Wrench with an adapter',
  'tightening-order': 'Tightening order',
  'injector-set': 'Injector set',
  'depth-over-bar': 'Depth over a bar',
  bore: 'Bore',
  'bearing-clearance': 'Bearing clearance',
  'ring-gap': 'Ring end gap',
  'bucket-shim': 'Bucket shim',
  flatness: 'Flatness',
  'compression-ratio': 'Compression ratio',
  compression: 'Compression',
  'leak-down': 'Leak-down',
  'gauge-fit': 'Gauge fit',
  'viscosity-grade': 'Viscosity grade',
  vin: 'Vehicle number check',
} as const;
export type WorksheetKind = keyof typeof WORKSHEETS;
