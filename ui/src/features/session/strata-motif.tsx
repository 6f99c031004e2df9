import { useColourMode } from '../../shared/theme/colour-mode';

const WIDTH = 860;
const HEIGHT = 900;
const TOP = 360;

// Bounds of conventional time slices [ka], youngest on top.
const bounds = ['0 ka', '11.7', '14.7', '18', '23', '29', '57', '71', '116', '129'];
const thickness = [63, 41, 54, 68, 35, 40, 63, 49, 39, 60];
const tones = {
  light: [
    '#E4DAC2',
    '#D8C69A',
    '#CBD8DD',
    '#B8CCD4',
    '#D2B683',
    '#A9C0CB',
    '#8FAAB7',
    '#BC9150',
    '#6B8899',
    '#47637A',
    '#9A5A38',
  ],
  dark: [
    '#4A4536',
    '#5B4D2F',
    '#31444F',
    '#2A3F4B',
    '#5F4C2A',
    '#26404F',
    '#203845',
    '#6B4E23',
    '#1B303D',
    '#152735',
    '#5A2F1E',
  ],
};
const skies = { light: ['#EEF4F6', '#F8F3E6'], dark: ['#0D161D', '#1C2226'] };

/** Depth of a contact at x; each bed bends a little otherwise than the one above, rising to the right. */
function depthAt(bed: number, x: number): number {
  const whole = Math.floor(bed);
  const above = thickness.slice(0, whole).reduce((sum, one) => sum + one, 0);
  const base = TOP + above + (bed - whole) * (thickness[whole] ?? 60);
  const rise = 42 / (1 + Math.exp(-(x - 640) / 60)) + 4 * Math.sin(x / 210);
  const bends = 7 * Math.sin(x / 96 + bed * 0.9) + 4 * Math.sin(x / 47 + bed * 1.7);
  return base - rise * (1 - bed / 14) + bends;
}

const contact = (bed: number) =>
  Array.from({ length: 87 }, (_, step) => `${step * 10} ${depthAt(bed, step * 10).toFixed(1)}`).join('L');

const dashes = (bed: number, line: number) =>
  `${14 + ((bed * 13 + line * 7) % 40)} ${8 + ((line * 5 + bed) % 14)} ${30 + ((bed * 5 + line * 11) % 50)} ${6 + (bed % 5)}`;

/** The low sun over beds of dust, with the ages of their contacts. */
export function StrataMotif() {
  const { mode } = useColourMode();
  const ink = mode === 'light' ? '#17212B' : '#FFFFFF';
  const pale = (bed: number) => bed > 7 || mode === 'dark';
  return (
    <svg viewBox={`0 0 ${WIDTH} ${HEIGHT}`} preserveAspectRatio="xMinYMid slice" aria-hidden="true">
      <defs>
        <linearGradient id="motif-sky" x1="0" y1="0" x2="0" y2="1">
          <stop offset="0" stopColor={skies[mode][0]} />
          <stop offset=".5" stopColor={skies[mode][1]} />
        </linearGradient>
        <radialGradient id="motif-haze">
          <stop offset="0" stopColor="#D9A75A" stopOpacity={mode === 'light' ? 0.42 : 0.28} />
          <stop offset="1" stopColor="#D9A75A" stopOpacity="0" />
        </radialGradient>
      </defs>
      <rect width={WIDTH} height={HEIGHT} fill="url(#motif-sky)" />
      <circle cx={585} cy={259} r={234} fill="url(#motif-haze)" />
      <circle cx={585} cy={259} r={41} fill={mode === 'light' ? '#E9BE76' : '#C08F45'} />
      {tones[mode].map((tone, bed) => (
        <g key={tone}>
          <path d={`M${contact(bed)}L${WIDTH} ${HEIGHT}L0 ${HEIGHT}Z`} fill={tone} />
          <path
            d={`M${contact(bed)}`}
            fill="none"
            stroke={ink}
            strokeOpacity={mode === 'light' ? 0.22 : 0.12}
            strokeWidth=".9"
          />
          {[0.22, 0.4, 0.58, 0.76].map((share, line) => (
            <path
              key={share}
              d={`M${contact(bed + share)}`}
              fill="none"
              stroke={pale(bed) ? '#FFFFFF' : '#17212B'}
              strokeOpacity={0.16}
              strokeWidth=".8"
              strokeDasharray={dashes(bed, line)}
            />
          ))}
        </g>
      ))}
      {bounds.map((age, bed) => (
        <g key={age} fill={pale(bed) ? '#F3EEE2' : '#17212B'} stroke="none">
          <rect x="0" y={depthAt(bed, 0) - 0.6} width="14" height="1.2" />
          <text x="20" y={depthAt(bed, 20) + 15} fontSize="12" opacity=".85">
            {age}
          </text>
        </g>
      ))}
    </svg>
  );
}
