import { studySettings, studyTexts } from '@/lib/study/document/study-document'

/** What the calculation takes until somebody says otherwise; each is printed in the report. */
export const defaultSettings = () =>
  studySettings.parse({
    speedCriterion: '98 %',
    timeLimit: '60 s',
    thermalState: 'hot',
    closeOfLimit: '10 %',
    closeVoltage: '0.01 pu',
    startsPerDay: '6',
    startsPerHour: '1',
  })

export const emptyTexts = studyTexts.parse({})
