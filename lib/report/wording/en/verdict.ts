import type { VerdictWord } from '@/lib/engine/criteria/rule'

/** Words of the verdict page and the limits matrix. */
export const verdict = {
  title: 'Verdict',
  whole: {
    meets: 'The design cases meet every limit in use.',
    close: 'The design cases meet every limit in use, some by a narrow margin.',
    fails: 'The design cases fail at least one limit in use.',
    'not-assessed': 'The whole is not assessed: at least one limit in use has no figure.',
  } satisfies Record<VerdictWord, string>,
  noDesignCase: 'No case is marked as a design case, so there is nothing that the whole could meet.',
  governing: 'Governing limit',
  noGoverning: 'No limit was held against a design case.',
  noneAssessed: 'No limit in use has a figure, so none governs.',
  governingPlace: (place: string, instant: string | null) =>
    `at ${place}${instant === null ? '' : `, ${instant} after the first switching-on`}`,
  supply: (tag: string, level: string) => `supply “${tag}” (${level})`,
  answers: 'Figures of the governing case',
  answerNames: {
    standstillVoltage: 'Voltage at the motor, at standstill',
    currents: 'Line and motor current, at standstill',
    torque: 'Least accelerating torque',
    runUp: 'Run-up',
    heat: 'Heat used',
    deepest: (place: string) => `Deepest change at ${place}`,
  },
  ofRated: 'of rated',
  ofBefore: 'of the voltage before the start',
  atSpeed: (speed: string) => `at ${speed}`,
  atTime: (time: string) => `at ${time}`,
  toCriterion: (time: string, criterion: string) => `${time} to ${criterion} of rated speed`,
  inPosition: (time: string) => `running position after ${time}`,
  ofPermissible: (state: string) => `of the permissible heat from ${state}`,
  notReached: 'not reached',
  notDeclared: 'not declared by the maker',
  findings: 'Findings',
  findingsNote: 'Written by the program from the results.',
  counted: (cases: number, checks: number) =>
    `${cases} design case${cases === 1 ? '' : 's'} held against the limits sheet: ${checks} checks in use.`,
  tally: (meets: number, close: number, fails: number, open: number) =>
    `${meets} meet, ${close} close, ${fails} fail, ${open} not assessed.`,
  row: (rule: string, what: string, figure: string, cases: string) => `**${rule}** ${what}: ${figure} in ${cases}`,
  allMeet: 'No limit in use is failed or closely met by a design case.',
  comparedFailing: 'Compared with the proposal, these cases fail a limit in use:',
  failingCase: (tag: string, rules: string) => `**${tag}** (${rules})`,
  conditions: 'Conditions',
  conditionsNote: 'What the verdict rests on, written by the program from records and results.',
  startsClass: (perDay: string, perHour: string) =>
    `At most ${perDay} starts a day and ${perHour} an hour: limits that depend on how often a motor is started were chosen for these.`,
  methodsHeld: (methods: string) => `Starting methods as recorded: ${methods}.`,
  onlyComputed:
    'Only the combinations of supply, running plant, starting method and load that were computed are covered.',
  makerStarts: (motor: string, words: string) => `Maker's starts in succession, ${motor}: ${words}.`,
  startsWords: (cold: number | null, hot: number | null, hour: number | null) =>
    [
      ...(cold === null ? [] : [`${cold} from cold`]),
      ...(hot === null ? [] : [`${hot} from hot`]),
      ...(hour === null ? [] : [`at most ${hour} an hour`]),
    ].join(', '),
  unknownNames: (names: string) => `Texts of the author name values that this study does not have: ${names}.`,
  mustExclude: (tags: string) =>
    `The departures ${tags} fail a limit in use. They must be excluded by the plant or by the order, or accepted by whoever owns the limit.`,
  hangs: (tags: string) =>
    `In ${tags} a start does not complete. The plant must detect a start that does not complete and trip it.`,
  overDuty: (cases: string) =>
    `In ${cases} a starting device is asked for more than its duty allows; a device with a higher duty, or fewer and shorter starts, is needed.`,
  notSwitchedOn: (cases: string) =>
    `In ${cases} a motor is not switched on, because the start that it waits for fails.`,
  lost: (cases: string) => `In ${cases} a running motor is lost: it drops out for good or pulls out.`,
  tooEarly: (tags: string) => `In ${tags} the starter changes over too early; the setting must exclude it.`,
  verifyLimits: (count: number) =>
    `${count} limit${count === 1 ? ' is' : 's are'} marked “verify against your edition” and must be verified before the report is relied on.`,
  assumed: (count: number) =>
    `${count} input${count === 1 ? ' is' : 's are'} assumed or derived rather than stated by anybody; see the assumptions.`,
  noSource: (count: number) => `${count} input${count === 1 ? ' has' : 's have'} no source stated.`,
  openData: (count: number) =>
    `${count} item${count === 1 ? '' : 's'} of data ${count === 1 ? 'is' : 'are'} open; see the open data.`,
  recommendation: 'Recommendation',
  recommendationNote: "The engineer's own words.",
  noRecommendation: 'No recommendation was typed. The findings above are the program’s and do not replace one.',
  conclusions: 'Conclusions',
  noConclusions: 'No conclusions were typed.',
  matrix: {
    title: 'Limits matrix',
    intro:
      'Every limit against every case. Each cell gives the mark of the verdict and the figure that it rests on, in the unit of the column head; the limits are worded in the acceptance criteria.',
    roles: { design: 'Design cases', comparison: 'Compared with the proposal', sensitivity: 'Sensitivities' },
    case: 'Case',
    notApplicable: 'n/a',
    notApplicableMeaning: 'the limit is not written for this case',
    grey: 'grey',
    greyMeaning: 'the limit is for a class of starts that is not in use; the figure does not count',
    allAssessed: 'Every limit was assessed wherever it applies.',
    notAssessed: 'Not assessed, and why',
    notReached: 'beyond',
    reasonHeads: { limit: 'Limit', case: 'Case', reason: 'Reason' },
    missed: 'A fail without a figure: the start never reached what the limit asks for, or the voltage collapsed.',
  },
}
