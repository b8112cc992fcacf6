import type { Standpoint } from './solid-scene';

/** From where a solid is seen, in words: "from the left side and the far end, 40° above". */
export function standpointText({ aroundDeg, aboveDeg }: Standpoint): string {
  const above = Math.round(aboveDeg / 5) * 5;
  if (above >= 85) return 'from straight above';
  if (above <= -85) return 'from straight below';
  const height = above === 0 ? '' : `, ${Math.abs(above)}° ${above > 0 ? 'above' : 'below'}`;
  return `from the ${sideText(aroundDeg)}${height}`;
}

const SIDES = ['left side', 'far end', 'right side', 'near end'] as const;

function sideText(aroundDeg: number): string {
  const turns = (((aroundDeg % 360) + 360) % 360) / 90;
  const eighth = Math.round(turns * 2) % 8;
  const first = SIDES[Math.floor(eighth / 2) % 4] as string;
  return eighth % 2 === 0 ? first : `${first} and the ${SIDES[(Math.floor(eighth / 2) + 1) % 4] as string}`;
}
