/**
 * Angle by which a vector group makes the low-voltage side lag the high-voltage side, rad: the clock number times 30°
 * (Dyn11: 330°, that is 30° ahead). Null where the text ends in no clock number from 0 to 11: the group is then unstated.
 */
export const lagOfGroup = (group: string): number | null => {
  const clock = /^[DYZIN]+-?[dyzinIa]+-?(1[01]|[0-9])$/i.exec(group.replace(/\s/g, ''))?.[1]
  return clock === undefined ? null : (Number(clock) * Math.PI) / 6
}
