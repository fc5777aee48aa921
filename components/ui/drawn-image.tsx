export interface DrawnImageProps {
  /** A whole SVG file, made by our own server. */
  svg: string
  alt: string
  className?: string
}

/** A drawing that came as text, shown as a picture: nothing in it can run, and a screen reader hears one name. */
export function DrawnImage({ svg, alt, className }: DrawnImageProps) {
  // eslint-disable-next-line @next/next/no-img-element -- a drawing that is in the page already has nothing to be optimised
  return <img alt={alt} className={className} src={`data:image/svg+xml,${encodeURIComponent(svg)}`} />
}
