/** Seven bars across the board, each cut a hair off the last. */
const BARS = [
  { x: 0, top: 3 }, { x: 94, top: 1 }, { x: 186, top: 2 }, { x: 279, top: 0 }, { x: 372, top: 2 }, { x: 464, top: 1 }, { x: 557, top: 3 },
] as const;
const WIDTH = 89;
const HEIGHT = 648;

/** Where the raspberry was poured into the cream, over the whole loaf before it was cut. */
const SWIRL = [
  'M-20 60C60 20 130 90 210 40S330 -10 380 60 300 110 240 96 110 70 60 110 -20 130 -20 100z',
  'M-20 240C60 200 140 300 240 250S420 130 520 170 600 110 670 150V226C600 190 560 250 470 246S300 330 210 326 70 300 -20 340z',
  'M-20 420C50 360 120 400 190 380S280 300 360 340 470 430 560 380 640 330 670 350V398C600 400 560 460 480 440S350 400 290 440 150 470 90 500 20 470 -20 510z',
  'M-20 560C60 520 150 560 230 540S400 470 480 520 600 560 670 520V590C600 610 540 570 470 590S300 610 220 600 80 620 -20 640z',
] as const;

/** A cut loaf on the grey board under one low lamp. Decorative; worked out by the browser, no picture is fetched. */
export function LampLoaf() {
  return (
    <svg viewBox="0 0 780 900" preserveAspectRatio="xMidYMid slice" aria-hidden="true" focusable="false" className="fill-keeps absolute inset-0 h-full w-full">
      <defs>
        <filter id="lamp-board" x="0" y="0" width="100%" height="100%" colorInterpolationFilters="sRGB">
          <feTurbulence type="fractalNoise" baseFrequency="0.16" numOctaves="2" seed="4" />
          <feDiffuseLighting surfaceScale="0.7" diffuseConstant="1.5" lightingColor="#fff"><feDistantLight azimuth="200" elevation="42" /></feDiffuseLighting>
          <feComposite in2="SourceGraphic" operator="arithmetic" k1="1" />
        </filter>
        <filter id="lamp-soap" x="-2%" y="-2%" width="104%" height="104%" colorInterpolationFilters="sRGB">
          <feTurbulence type="fractalNoise" baseFrequency="0.0085 0.015" numOctaves="3" seed="23" result="noise" />
          <feGaussianBlur in="noise" stdDeviation="2.2" result="waves" />
          <feTurbulence type="fractalNoise" baseFrequency="0.42" numOctaves="2" seed="3" result="grain" />
          <feDisplacementMap in="SourceGraphic" in2="noise" scale="92" xChannelSelector="R" yChannelSelector="G" result="poured" />
          <feDiffuseLighting in="waves" surfaceScale="46" diffuseConstant="1.32" lightingColor="#fffaf0" result="folds"><feDistantLight azimuth="205" elevation="50" /></feDiffuseLighting>
          <feDiffuseLighting in="grain" surfaceScale="0.5" diffuseConstant="1.3" lightingColor="#fff" result="pores"><feDistantLight azimuth="205" elevation="52" /></feDiffuseLighting>
          <feBlend in="folds" in2="pores" mode="multiply" result="lit" />
          <feComposite in="poured" in2="lit" operator="arithmetic" k1="0.7" k2="0.34" k3="0" k4="0" result="soap" />
          <feComposite in="soap" in2="SourceAlpha" operator="in" />
        </filter>
        <filter id="lamp-soft" x="-10%" y="-10%" width="120%" height="120%"><feGaussianBlur stdDeviation="5" /></filter>
        <radialGradient id="lamp-fall" cx="0.16" cy="0.3" r="1.05">
          <stop offset="0" stopColor="#000" stopOpacity="0" />
          <stop offset="0.55" stopColor="#000" stopOpacity="0.12" />
          <stop offset="1" stopColor="#000" stopOpacity="0.5" />
        </radialGradient>
        <clipPath id="lamp-bars">
          {BARS.map(({ x, top }) => <rect key={x} x={x} y={top} width={WIDTH} height={HEIGHT - top} rx="3" />)}
        </clipPath>
      </defs>
      <rect width="780" height="900" fill="#8c8c8c" filter="url(#lamp-board)" />
      <path d="M66 772L140 796H800V150L712 126z" fill="#1d1d1c" opacity="0.62" filter="url(#lamp-soft)" />
      <g transform="translate(68 124)">
        <rect x="1" y="5" width="645" height="643" fill="#2d2a28" opacity="0.85" />
        <g clipPath="url(#lamp-bars)">
          <g filter="url(#lamp-soap)">
            <rect x="-20" y="-20" width="690" height="690" fill="#e2d0ab" />
            {SWIRL.map((path) => <path key={path} d={path} fill="#9d5556" />)}
            <path d="M590 20C640 60 610 120 660 160V0zM560 420C600 380 630 430 670 400V560C620 570 640 500 600 520S520 470 560 420zM420 560C470 540 500 580 480 610S400 600 420 560z" fill="#f0efec" opacity="0.9" />
          </g>
        </g>
        {BARS.map(({ x, top }) => (
          <g key={x}>
            <path d={`M${x + 1} ${HEIGHT}V${top + 2}H${x + WIDTH}`} fill="none" stroke="#fff" strokeOpacity="0.42" strokeWidth="2" />
            <path d={`M${x + WIDTH - 1} ${top + 2}V${HEIGHT}`} fill="none" stroke="#000" strokeOpacity="0.4" strokeWidth="2.5" />
          </g>
        ))}
      </g>
      <rect width="780" height="900" fill="url(#lamp-fall)" />
    </svg>
  );
}
