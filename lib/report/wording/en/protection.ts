/** Words of the relay of a feeder, its margins and the starts allowed. */
export const protection = {
  fields: {
    thermalLimits: 'Thermal limit',
    coolingRunning: 'Cooling time constant, running',
    coolingStopped: 'Cooling time constant, at standstill',
    relay: 'Relay',
    measures: 'Relay measures',
    sides: { line: 'line side of the starting device', motor: 'current of the motor' },
    transformer: 'Current transformer',
    ratio: (primary: string, secondary: string) => `${primary} / ${secondary}`,
    elements: 'Relay settings',
    settingsIn: { primary: 'primary', secondary: 'secondary' },
    settings: (elements: string, side: string) => `${elements} (${side} values)`,
    limitPoint: (state: string, current: string, time: string) => `${state} ${current}: ${time}`,
  },
  margins: {
    title: 'Relay against start and thermal limit',
    intro:
      'The elements of each relay are driven by the current of the run. “To a trip” is the least time that the first element still needs at any instant of the start, if the current of that instant stayed; it is negative where the element operates before the start is over. With the rotor held, the permissible time at the current of that start is set against the time to trip.',
    heads: {
      case: 'Case',
      motor: 'Motor',
      voltage: 'Motor at standstill, % of rated',
      started: 'Started, s',
      operates: 'Trip, s',
      margin: 'To a trip, s',
      held: 'Rotor held, A',
      heldTrip: 'Trip, s',
      permissible: 'Permissible, s',
      heldMargin: 'Margin, s',
      closest: 'Closest on the limit curve, s (at A)',
      remark: 'Remark',
    },
    worst: 'lowest voltage',
    best: 'highest voltage',
    inhibited: (rest: string) => `not released for ${rest}`,
    none: 'No started motor has a relay stated, so that no margin to a trip is given.',
    caution:
      'A start that ends before the trip shows that a start is possible. Settings of protection are the work of a licensed engineer with local codes, the data of the makers of relay and motor, and the tolerances of both, which are not in these times.',
  },
  heat: {
    title: 'Heat of starts and starts allowed',
    intro:
      'Heat in per cent of what a locked rotor may bring from cold. Starts an hour are the least that the maker of the motor, the starting device, the class of starts of the limits and the process allow; the heat balance lowers that number and never raises it, nor stands for a number that nobody states. Starts in succession are those of the maker; by heat they can only be fewer.',
    heads: {
      case: 'Case',
      motor: 'Motor',
      ofStart: 'Of the start, %',
      before: 'Before, %',
      after: 'After, %',
      makers: 'Maker, cold / hot',
      succession: 'By heat, cold / hot',
      rest: 'Rest before the next, min',
      perHour: 'An hour, by heat',
      allowed: 'Starts an hour allowed',
    },
  },
  figure: (motor: string) =>
    `Start of ${motor} against the elements of its relay and the thermal limits of the motor, logarithmic in both. Elements at a steady current from their state at switching-on.`,
  method: [
    {
      id: 'method-protection',
      title: 'Protection and heat of starts',
      content: [
        'An inverse element operates on a changing current when what it has travelled comes to one; times at steady current are those of IEC 60255-151 and IEEE C37.112 with M the current over the setting:',
        {
          tex: String.raw`\int \frac{\mathrm{d}t}{t(M)} = 1,\qquad t(M) = m\left(\frac{A}{M^{P}-1} + B\right)`,
          spoken:
            'The integral of time over operating time comes to one; operating time is the multiplier times A over M to the P less one, plus B.',
        },
        'Below its setting an IEEE element falls back in m·t_{r}/(1 − M^{2}) with the published t_{r}, an IEC element at once, unless a reset time is stated. An element with a definite time counts while the current is above it. A class of IEC 60947-4-1 fixes points, not a curve: it is taken as I^{2}t through its point at 7.2 times the setting, the fast end against the start, the slow end against the permissible time, from cold and without cooling. The thermal image of IEC 60255-149 has a time constant for heating and one for cooling:',
        {
          tex: String.raw`\tau\,\frac{\mathrm{d}\theta}{\mathrm{d}t} = \left(\frac{I}{k\,I_\mathrm{b}}\right)^2 - \theta,\qquad \theta = 1:\ \text{trip}`,
          spoken:
            'Tau times the derivative of theta is the square of current over k times basic current, less theta; it trips at theta one.',
        },
        'A relay that operates before a start is over takes the motor off the line in the run. Where a start hangs, its outcome stays what it is and the instant of the trip stands beside it. Currents are RMS of the fundamental: the offset of the first cycles, errors of current transformers and tolerances of the relay are not in them. The rotor held draws the current of standstill, or behind a soft starter or drive the largest of the start.',
        'The permissible time follows the typed points of the thermal limit, straight on logarithmic scales, and I^{2}t = constant through the locked-rotor time beyond them and for a locked rotor at reduced voltage. Each start adds its heat used; over a rest the heat falls with the constant of standstill towards ambient, or not at all where that is unknown. Running at full load counts as 1 − t_{hot}/t_{cold}. Starts an hour by heat are those of a sequence without end, the motor stopped in between or running, whichever is worse.',
      ],
    },
  ],
}
