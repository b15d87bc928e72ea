/** Names of fields that do not read well when their key is merely put into words. */
const named: Record<string, string> = {
  xOverR: 'X/R',
  statedAt: 'voltage of the level',
  before: 'voltage before the start',
  fromVoltage: 'rated voltage, from side',
  toVoltage: 'rated voltage, to side',
  lockedRotorCurrent: 'locked-rotor current',
  lockedRotorTorque: 'locked-rotor torque',
  lockedRotorPowerFactor: 'locked-rotor power factor',
  pullUpTorque: 'pull-up torque',
  permissibleCold: 'permissible locked-rotor time, cold',
  permissibleHot: 'permissible locked-rotor time, hot',
  startsCold: 'starts in succession, cold',
  startsHot: 'starts in succession, hot',
  startsPerHour: 'starts an hour',
  startsPerDay: 'starts a day',
  plantMotorsIncluded: "plant's motors in the level",
  constant: 'torque at zero speed',
  atRated: 'torque at rated speed',
  own: 'own',
  si: 'value',
  nominal: 'nominal voltage',
  changeOver: 'change-over',
  closeOfLimit: 'margin that reads close, of a limit',
  closeVoltage: 'margin that reads close, of a voltage',
  appliesTo: 'applies to',
  loadsOff: 'loads off',
}

const spoken = (key: string): string =>
  named[key] ?? key.replace(/([a-z])([A-Z])/g, (_, a: string, b: string) => `${a} ${b.toLowerCase()}`)

/** A field below a record, as one says it: `locked-rotor current`, `curves valve closed, points 3, torque`. */
export const fieldWords = (path: readonly (string | number)[]): string =>
  path.map((step) => (typeof step === 'number' ? String(step + 1) : spoken(step))).join(', ')

/** What a record of each list of the document is called. */
export const recordNouns: Record<string, string> = {
  buses: 'Bus',
  supplies: 'Supply',
  transformers: 'Transformer',
  lines: 'Line',
  loads: 'Load',
  capacitors: 'Capacitor',
  motors: 'Motor',
  drivenLoads: 'Driven load',
  starters: 'Starting method',
  plantConditions: 'Plant condition',
  loadConditions: 'Load condition',
  schedules: 'Schedule',
  cases: 'Case',
  limits: 'Limit',
}
