/**
 * The hatchings by which parts of a variance are told apart without colour; look 0 is solid and needs none. Once on
 * the page.
 */
export function ShareLooks() {
  return (
    <svg className="share-looks" width="0" height="0" aria-hidden="true">
      <defs>
        <pattern id="share-look-1" width="3" height="3" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
          <line x1="0" x2="0" y1="0" y2="3" strokeWidth="2.2" />
        </pattern>
        <pattern id="share-look-2" width="3" height="3" patternUnits="userSpaceOnUse">
          <circle cx="1.5" cy="1.5" r="0.9" />
        </pattern>
        <pattern id="share-look-3" width="3" height="3" patternUnits="userSpaceOnUse">
          <line x1="0" x2="3" y1="1.5" y2="1.5" strokeWidth="1.1" />
        </pattern>
        <pattern
          id="share-look-4"
          width="4.5"
          height="4.5"
          patternUnits="userSpaceOnUse"
          patternTransform="rotate(-45)"
        >
          <line x1="0" x2="0" y1="0" y2="4.5" strokeWidth="1.1" />
        </pattern>
        <pattern id="share-look-5" width="4" height="4" patternUnits="userSpaceOnUse">
          <path d="M0 2H4M2 0V4" strokeWidth="0.8" />
        </pattern>
      </defs>
    </svg>
  );
}
