/**
 * Words that laboratories write in several ways for one thing, in one language or across them; the first stands for
 * all. Only words that mean the same wherever a heading has them. Common practice, no source.
 */
const groups = `
  max maximum maximal maximale maximaler maxima maximo maxi
  min minimum minimal minima minimo mini
  mass masse masa weight wt wgt weights peso poids gewicht
  content contents cont contenido gehalt
  temperature temp temperatur temperatura tmp
  theoretical theor theo theoretic theorique teorica teorico
  effective eff effectif effective efectivo efectiva effektiv effektives effektiver
  total tot totale totales
  asphalt asph
  bitumen bit betun bitume
  aggregate agg aggr aggs aggregates
  cumulative cum cumul cumulated cumule cumules cumulee cumulees acum acumulado acumulados acumulada kumuliert kum kumulierter accumulated
  individual ind indiv
  retained ret
  conditioned cond
  unconditioned uncond
  absorption abs absorcion
  volume vol volumen
  height ht
  thickness thick thk
  diameter dia diam diametre diametro
  strength str
  saturation sat saturacion
  degree deg degre grado
  elongated elong
  fractured fract
  equivalent equiv eq equivalente aquivalent
  vertical vert verticale vertikale
  horizontal horiz hor horizontale
  deformation def deformacion
  displacement displ disp
  stability stab
  estabilidad estab
  dynamic dyn
  combined comb blended
  viscosity visc
  point pt
  apparent app
  coefficient coef coeff coeficiente koeffizient
  replacement repl
  required req reqd
  limit lim
  tolerance tol
  surface surf
  specimen specim
  sg sgr
  technician tech
  telephone tel
  moisture moist
  sulfate sulphate sulfato
`;

export const sameWords: ReadonlyMap<string, string> = new Map(
  groups
    .trim()
    .split('\n')
    .flatMap((line) => {
      const [first = '', ...others] = line.trim().split(/\s+/);
      return others.map((other): [string, string] => [other, first]);
    }),
);
