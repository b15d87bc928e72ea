/** A formula with the words that say it to a reader who cannot see it. */
export interface FormulaWords {
  tex: string
  spoken: string
}

const formula = (tex: string, spoken: string): FormulaWords => ({ tex, spoken })

/** The method in words and formulas, in the order in which a case is computed. Strings are paragraphs. */
export const method = {
  title: 'Method',
  intro:
    'Each case is computed quasi-statically unless it says otherwise: the network is solved in balanced RMS values at every instant of the run-up, and the speeds of all machines are integrated through these solutions. Nothing is taken from rated voltage that depends on the actual one.',
  parts: [
    {
      id: 'method-network',
      title: 'Supply and network',
      content: [
        'The supply is a Thevenin equivalent. Its impedance follows from the stated level, with the voltage factor c that the level already contains and the voltage that it was stated at:',
        formula(
          String.raw`\left|\underline{Z}_\mathrm{s}\right| = \frac{c\,U^2}{S_\mathrm{k}},\qquad X_\mathrm{s} = R_\mathrm{s}\cdot(X/R)`,
          'The magnitude of the source impedance is c times U squared over the short-circuit level; its parts follow from X over R.',
        ),
        'The voltage of the source is solved so that the supply bus has the stated voltage before the start, with the running load on and the starting devices off, unless the open-circuit voltage is given. It is then held, and tap changers and line regulators are taken as frozen during the run.',
        'Transformers have their impedance on the to side, unchanged by the tap; a positive tap on the from side lowers the to side. Lines and cables are a series impedance with half of their susceptance at either end. Every rating converts with its own rated voltage.',
        'A static load follows its voltage u, in parts of its rated voltage, by its shares of constant impedance z, current i and power p; below the floor it turns to constant impedance:',
        formula(
          String.raw`\underline{S}(u) = \underline{S}_0\left(z\,u^2 + i\,u + p\right),\qquad \underline{S}(u) = \underline{S}(u_\mathrm{f})\left(\frac{u}{u_\mathrm{f}}\right)^2\ \text{for}\ u<u_\mathrm{f}`,
          'S of u is S zero times z u squared plus i u plus p; below the floor it falls with the square of the voltage.',
        ),
        'The bus voltages are the solution of the current balance by Newton’s method with both derivatives of every current. Where there is none, the outcome is a voltage collapse with its instant and bus, never a number:',
        formula(
          String.raw`\underline{\mathbf{Y}}\,\underline{\mathbf{V}} + \left(\frac{\underline{\mathbf{S}}(\mathbf{V})}{\underline{\mathbf{V}}}\right)^{*} = \underline{\mathbf{J}}`,
          'The admittance matrix times the voltages plus the conjugate of load power over voltage equals the source currents.',
        ),
      ],
    },
    {
      id: 'method-generator',
      title: 'Generators and transfers',
      content: [
        'A generator as supply is computed by two-axis theory without saturation, with X″_{q} taken as X″_{d}. The first instant lies behind X″_{d}, or behind X′_{d} where no sub-transient values are stated; then the field and the damper decay and the regulator answers:',
        formula(
          String.raw`T'_\mathrm{d0}\,\dot E'_\mathrm{q} = E_\mathrm{fd} - E'_\mathrm{q} - (X_\mathrm{d}-X'_\mathrm{d})\,I_\mathrm{d},\qquad T_\mathrm{e}\,\dot E_\mathrm{fd} = \left[K\,(U_\mathrm{ref}-U)\right]_0^{\max} - E_\mathrm{fd}`,
          'The field follows excitation minus transient EMF minus armature reaction; excitation follows the regulator, held between zero and its ceiling, with a lag.',
        ),
        formula(
          String.raw`T_\mathrm{g}\,\dot P_\mathrm{m} = \left[P_\mathrm{ref} - \frac{n-1}{\delta}\,S_\mathrm{r}\right]_0^{\max} - P_\mathrm{m},\qquad 2H\,S_\mathrm{r}\,\dot n = P_\mathrm{m} - P_\mathrm{e}`,
          'Mechanical power follows the governor with droop and a lag; speed follows the difference of mechanical and electrical power over twice H.',
        ),
        'The ceiling stands before the lag of the exciter, so that excitation rises towards it. Before the start the set runs at rated frequency and holds the stated voltage. Reactances and synchronous speeds follow the frequency; static loads do not. The sustained dip is found by letting the regulator come to rest with every speed held.',
        'On a transfer the plant is without supply for the stated time and comes on a second supply that waits unloaded at its voltage. Residual voltages of motors are left out: a return quicker than the stated decay is not assessed.',
      ],
    },
    {
      id: 'method-motor',
      title: 'Motors',
      content: [
        'A motor is its star-equivalent circuit with one or two cages at slip s, stator impedance Z_{s}, magnetising reactance X_{m} and core loss R_{c}:',
        formula(
          String.raw`\underline{Y}_\mathrm{r} = \sum_{k}\frac{s}{R_k + \mathrm{j}sX_k},\qquad \underline{Y}_\mathrm{e} = \underline{Y}_\mathrm{r} + \frac{1}{\mathrm{j}X_\mathrm{m}} + \frac{1}{R_\mathrm{c}},\qquad \underline{y} = \frac{\underline{Y}_\mathrm{e}}{1+\underline{Z}_\mathrm{s}\underline{Y}_\mathrm{e}}`,
          'Rotor admittance as the sum over the cages, then with magnetising branch and core, then behind the stator impedance.',
        ),
        formula(
          String.raw`T = \frac{U^2}{\omega_\mathrm{s}}\left|\frac{1}{1+\underline{Z}_\mathrm{s}\underline{Y}_\mathrm{e}}\right|^2 \operatorname{Re}\underline{Y}_\mathrm{r}`,
          'Torque is the airgap power over synchronous speed.',
        ),
        'The torque is that of the airgap power; friction, windage and stray losses are not taken off it, and the losses that are not in a winding lie in R_{c}. Torque is proportional to the square of the voltage and current to the voltage. Saturation of the leakage paths makes the square optimistic at low voltage; where a motor starts below 0.85 of its rated voltage the start is computed once more with the power 2.25. A circuit estimated from a nameplate is the plainest of those that meet it; others that meet it as well are computed too, and the verdict is that of the worst.',
        'A deep-bar cage has a resistance and a reactance that depend on slip: linear between the values at synchronous speed and those at standstill, or by the law of a bar of reduced depth ξ. A motor known by its curves has torque ∝ U², current ∝ U and the typed power factor, straight between points unless a monotone cubic is chosen; the curves are never extended beyond standstill or synchronous speed, and those that end at rated speed are closed with zero torque and the reactive part of their last current. Typed torque may replace that of a circuit, which then gives current and power factor alone.',
        formula(
          String.raw`k_R = \xi\,\frac{\sinh 2\xi + \sin 2\xi}{\cosh 2\xi - \cos 2\xi},\qquad k_X = \frac{3}{2\xi}\,\frac{\sinh 2\xi - \sin 2\xi}{\cosh 2\xi - \cos 2\xi},\qquad \xi = \xi_1\sqrt{|s|}`,
          'Factors on resistance and slot reactance of a bar against its reduced depth, which goes with the root of slip.',
        ),
        'Where exponents of saturation are stated, current and torque follow their powers of the voltage from breakdown slip on, fading to 1 and 2 at rated slip and never above rated voltage; the input covers airgap power and the losses that go with the square of the current.',
        'Motors that run before the start are the same circuits, with their own speed, not constant loads: they slow down in the dip, draw more and deepen it. “Per cent speed” is of rated speed unless synchronous speed is named.',
      ],
    },
    {
      id: 'method-starters',
      title: 'Starting devices',
      content: [
        'An autotransformer with tap k and own impedance z on the line side shows the line the admittance below; the line current is k times the motor current, and both are reported. Star connection shows a third of the admittance and gives a third of the torque:',
        formula(
          String.raw`\underline{y}_\mathrm{line} = \frac{1}{\underline{z} + \dfrac{1}{k^2\,\underline{y}}},\qquad I_\mathrm{line} = k\,I_\mathrm{motor},\qquad \underline{y}_\mathrm{star} = \frac{\underline{y}}{3}`,
          'Line admittance of an autotransformer, its line current, and the admittance in star.',
        ),
        'A reactor or resistor z in series shows y/(1 + z·y). A middle step of a closed transition counts only where its data are stated; otherwise it is taken as instantaneous. Part winding takes the stated shares of current and torque. Rotor resistance is added to each rotor phase of the circuit; its part of the slip loss falls outside the motor. A captive transformer is in series as a ratio and an impedance, before and after the start.',
        'A soft starter passes the part k of the bus voltage without losses and with the same current on both sides, so it is an adjustable reactance in front of the motor’s resistance R_{m}; k follows the ramp and is held down where the current limit asks for it, with the network solved at that limit. Harmonics are not in it:',
        formula(
          String.raw`R_\mathrm{m}^2 + X^2 = \frac{\left|\underline{Z}_\mathrm{m}\right|^2}{k^2},\qquad k \le 1`,
          'R m squared plus X squared equals the motor impedance squared over k squared, k at most one.',
        ),
        'Behind a drive the supply sees shaft power and losses at the drive’s own power factors, whatever the voltage; the magnetising current of the motor stays behind the converter. Losses go with the square of the motor current. The motor follows the ramp of speed as far as the limits of torque and current allow, and has started by the same criterion on the speed at the end of its ramp where that is below rated; its torque is taken as proportional to the part of the current that is not magnetising, at constant flux:',
        formula(
          String.raw`P = T\,\omega + P_\mathrm{loss}\left(m^2 + (1-m^2)\left(\frac{T}{T_\mathrm{r}}\right)^2\right),\qquad Q = P\tan\varphi_1`,
          'P is torque times speed plus losses that go with the square of the current; Q is P times the tangent of the displacement angle.',
        ),
        'Capacitors of a start are a susceptance at the line side of the device, each by its own rated voltage. A change-over follows its speed, time, current or voltage. A gap is without current and torque; the transient on reclosing is not in this model. The state just after each change-over is a result of its own, and a change-over at a slip above breakdown is called too early.',
      ],
    },
    {
      id: 'method-run-up',
      title: 'Run-up',
      content: [
        'Speed follows from the torque that is left, with all inertias referred to the motor shaft. The load opposes motion only; a motor that cannot break away stays at standstill and draws its current:',
        formula(
          String.raw`J\,\frac{\mathrm{d}\omega}{\mathrm{d}t} = T(U,\omega) - T_\mathrm{L}(\omega),\qquad J = J_\mathrm{M} + \sum_i J_i\left(\frac{n_i}{n}\right)^2`,
          'J times the derivative of speed is motor torque less load torque; J is the motor’s plus all others by the square of their speed ratio.',
        ),
        'A start may wait until another motor has started. Attempts that are abandoned or repeated are starts of their own in one run: the motor is switched off, coasts against its load and is switched on again after its rest, from the speed that it then has; warming from one to the next is not in the resistances.',
        'A dip of the supply multiplies the voltage of the source for its time; a supply that is away gives no voltage and no torque, and the residual voltage of motors that still turn is not in this model. A contactor drops out when the voltage has been below its level for its delay, and closes again likewise.',
        'A load curve is T_{0} + (T_{r} − T_{0})(n/n_{r})^{e} with a straight line from breakaway, or straight lines between typed points; no curve is extrapolated.',
        'A pump against a shut valve is T_{f} + (T_{shut} − T_{f})(n/n_{r})^{2}; against a static head it is as if shut until the check valve opens at n_{r}·√(H_{static}/H_{shut}), and goes by points from there. A typed formula is computed with as points, whose number and departure stand with it. An active load keeps the sign of its torque, may turn the shaft backwards and has an initial speed where one is stated. A gear refers torque, speed and inertia to the motor; two motors on one shaft have one speed, with their torques, loads and inertias added. A rise of torque within less than 0.2 % of the largest speed is spread over that much.',
      ],
    },
    {
      id: 'method-transient',
      title: 'Models with transients',
      content: [
        'A case may ask for machines of third or fifth order. The third order keeps the flux of each cage in every machine that has a circuit, with stator and network steady: the stator sees a voltage behind a transient impedance, and a machine that is cut off keeps its flux, which decays while it turns. It fits several machines and all starting devices but drives, soft starters and windings in part; these, and machines by curves or with exponents of saturation, stay steady circuits. While the supply is away each machine counts as open by itself, and the turn of the phases between star and delta is left out. At switching on the torque is still zero, so figures at standstill are those of the steady locked rotor, but for the voltage; the least accelerating torque is looked for once the swing of the fluxes is over, 0.2 s after a switching or half way up:',
        formula(
          String.raw`\underline{U} = \underline{Z}'\,\underline{I} + \mathrm{j}X_\mathrm{p}\sum_k \frac{\underline{\psi}_k}{X_k},\qquad \underline{Z}' = \underline{Z}_\mathrm{s} + \mathrm{j}X_\mathrm{p},\qquad \frac{\mathrm{d}\underline{\psi}_k}{\mathrm{d}t} = -\omega_\mathrm{b}\left(R_k\,\underline{I}_k + \mathrm{j}s\,\underline{\psi}_k\right)`,
          'Stator voltage as a voltage behind a transient impedance; each flux changes with the resistive drop of its cage and with slip.',
        ),
        'The fifth order follows one directly started machine with its stator too, in the synchronous frame without saturation and core loss, behind resistance and inductance of the network. Its equivalent is taken at up to 33 speeds along the quasi-static run-up: the voltage at the open terminals, and the impedance between open and loaded terminals, loads by their voltage and running machines at the speeds that they have there. The voltage of every other bus follows from the current through the transfer impedance as resistance and inductance; capacitors count by their value at supply frequency.',
        formula(
          String.raw`\frac{\mathrm{d}\psi_{q\mathrm{s}}}{\mathrm{d}t} = \omega_\mathrm{b}\left(v_q - \psi_{d\mathrm{s}} - R\,i_{q\mathrm{s}}\right),\qquad \frac{\mathrm{d}\psi_{qk}}{\mathrm{d}t} = -\omega_\mathrm{b}\left(s\,\psi_{dk} + R_k\,i_{qk}\right)`,
          'Derivatives of the stator flux and of the rotor fluxes in the q axis; the d axis is alike with the signs of the coupling turned.',
        ),
        'Its voltages are root mean squares over half a period of the supply, in the lowest of the phases, its currents in the highest; the highest voltage is that of the highest phase. Where no switching angle is stated every figure is that of the worst angle, which need not be the same for all. Figures at standstill are those of the locked rotor without direct component, but for the voltage. Limits are held against the half periods; the least accelerating torque is a mean over five periods. Core loss and the friction of a shaft below a thousandth of synchronous speed are the two simplifications of its own.',
        'A machine switched on directly within 10 % of synchronous speed, as an induction generator is, is of fifth order in any case: steady circuits see only where it settles. Open transitions and a supply that comes back while motors hold more than a quarter of their voltage are run by the third order too, and limits on voltage take the worse of both. Where neither model fits, such a limit is not assessed. Energising of transformers is in none of them.',
      ],
    },
    {
      id: 'method-results',
      title: 'What is taken from a run',
      content: [
        'Each place has its voltage before, at the first instant, at the deepest point of the whole run, settled after the start, and settled after the process loads. From these follow three figures that are never given without their reference:',
        formula(
          String.raw`\frac{U_\mathrm{before}-U}{U_\mathrm{before}},\qquad d = \frac{U_\mathrm{before}-U}{U_\mathrm{n}},\qquad \frac{U}{U_\mathrm{n}}`,
          'Change of the voltage before, change of nominal, remaining of nominal.',
        ),
        'Heat used up to the speed criterion is the larger of two figures, both against what the maker declares at rated voltage; neither is scaled with the actual voltage again:',
        formula(
          String.raw`\frac{\int I^2\,\mathrm{d}t}{I_\mathrm{LR}^2\,t_\mathrm{perm}},\qquad \frac{\int s\,P_\mathrm{ag}\,\mathrm{d}t}{T_\mathrm{LR}\,\omega_\mathrm{s}\,t_\mathrm{perm}}`,
          'The integral of current squared over locked-rotor current squared times permissible time; the slip energy over locked-rotor torque, synchronous speed and permissible time.',
        ),
        'The least accelerating torque is the least of motor torque less load torque from standstill to 95 % of rated speed, at the voltage that the motor really had.',
      ],
    },
  ] as readonly { id: string; title: string; content: readonly (string | FormulaWords)[] }[],
  control: {
    id: 'method-control',
    title: 'Error control and end of a run',
    criterion: (criterion: string, limit: string) =>
      `A motor has started when it reaches ${criterion} of its rated speed and its starting device is in the running position. The settled speed is approached without end, so a start time is never given without this criterion. A start is given up ${limit} after switching-on.`,
    accuracy:
      'The step of the integration is controlled by its local error, with a relative tolerance of 10^{−8} on speeds; switchings are located and the integration starts anew at each. The lowest voltage is searched over the whole run, not read at standstill. Steps, mismatches and error ratios of each case are in the calculation record.',
  },
  excluded: {
    id: 'method-excluded',
    title: 'What the model does not cover',
    items: [
      'Direct-current components and the first cycles of the current, outside the cases of fifth order and the table of peaks: there they are higher than the RMS figures.',
      'Transients on switching, on transfer and on reclosing, outside the cases with transient models; energising of transformers in all.',
      'Unbalance, harmonics, frequency excursions.',
      'Torsional vibration, water hammer and everything else on the process side.',
      'Warming of windings during the run: resistances are those of the records.',
    ],
  },
}
