/** Words of the comparison of methods, the measurements to take and the sheets to fill in. */
export const sheets = {
  comparison: {
    title: 'Comparison of starting methods',
    intro:
      'Cases that differ in the starting method alone stand together: same supply, running plant and load. The word is that of the worst limit in use; the limit that decides it stands beside it.',
    none: 'No two cases of this study differ in the starting method alone, so there is nothing to compare.',
    group: (motors: string, supply: string, plant: string, load: string) =>
      `${motors} on “${supply}”, ${plant}, ${load}`,
    heads: {
      case: 'Case',
      method: 'Starting method',
      change: (place: string) => `Deepest change at ${place}, %`,
      line: 'Line A at standstill',
      runUp: 'Run-up, s',
      torque: 'Least acc. torque, %',
      heat: 'Heat, %',
      verdict: 'Worst limit in use',
    },
    notReached: 'not reached',
  },
  commissioning: {
    title: 'Measurements that would validate the model',
    intro:
      'For each start of the design cases: what the model says, and room for what is measured at commissioning. Voltages are RMS over one period, renewed every half period, of all three line voltages at once with the current of the motor and, where it can be had, the speed. The running plant must be that of the case; where it is not, the case is computed again with what ran.',
    none: 'No design case starts a motor.',
    heads: { what: 'Quantity', predicted: 'Computed', measured: 'Measured' },
    start: (motor: string, tag: string) => `${motor} in case ${tag}`,
    before: (place: string) => `Voltage at ${place} before the start`,
    deepest: (place: string) => `Lowest voltage at ${place}, and when`,
    settled: (place: string) => `Voltage at ${place} after the start`,
    atMotor: 'Voltage at the motor just after switching-on',
    line: 'Line current just after switching-on, first period left out',
    changeOver: 'Change-over, and speed at it',
    runUp: (criterion: string) => `Time to ${criterion} of rated speed`,
    running: (motor: string) => `Lowest voltage at ${motor}, running`,
    notReached: 'not reached',
    after:
      'A voltage change that departs from the computed one by more than a tenth, or a run-up by more than a fifth, is a reason to look for the cause before the limits are relied on: voltage before the start and running plant first, then short-circuit level and X/R, then locked-rotor current and load torque.',
  },
  utility: {
    title: 'Data sheet for the utility',
    intro: (utility: string) =>
      `To be confirmed by ${utility}. Values in the table are those of the study; a blank is missing in the study and is asked for here.`,
    blank: 'blank – please state',
    unknown: 'unknown – please state',
    noUtility: 'the utility',
    ask: 'Also asked for',
    asked: [
      'whether the level is the least or the greatest of the next ten years, and which element of the network is out for it',
      'the limit on a single voltage change and on its number an hour and a day, with document, clause and edition',
      'the place at which the limits hold',
      'other large motors on the same line, and whether their starts can coincide',
      'reclosing of the line: dead time and number of attempts',
      'tap changers and line regulators upstream: delay and dead band',
    ],
    confirmed: 'Confirmed for the utility',
    lines: ['Name and position', 'Signature', 'Date'],
  },
  starts: {
    title: 'Start-count card',
    intro: (perDay: string, perHour: string) =>
      `For the board beside the push-button. The limits in use were chosen for at most ${perDay} starts a day and ${perHour} an hour over the whole plant; what the maker allows for a motor stands in its row. The least of all holds.`,
    none: 'No motor is started in a design case.',
    heads: {
      motor: 'Motor',
      cold: 'In succession, cold',
      hot: 'In succession, hot',
      hour: 'An hour',
      method: 'Starting method',
      duty: 'Starter’s duty',
    },
    notDeclared: 'not declared',
    log: 'Starts',
    logHeads: ['Date', 'Time', 'Motor', 'Hot or cold', 'Reached speed', 'Initials'],
    after:
      'After a start that was given up, the next counts as a start from hot. The heat figures of this report never allow more than the maker does.',
  },
}
