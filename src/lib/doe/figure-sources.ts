/** Where a figure comes from: its formula and who published the method. What goes in is said in words, in every language. */
export interface FigureSource {
  formula: string;
  /** Author and year, and where it was published. */
  source: string;
}

/** Every figure of an audit by name. Whoever shows one says in the reader's language what goes in. */
export const figureSources = {
  aliases: {
    formula: 'A = (X\u2081\u1d40X\u2081)\u207b\u00b9 X\u2081\u1d40X\u2082',
    source: 'G. E. P. Box, J. S. Hunter 1961, Technometrics 3, 311\u2013351, 449\u2013458',
  },
  errorLadder: {
    formula: 's\u00b2 = (SS pure + SS high) / (df pure + df high)',
    source: 'C. Daniel 1959, Technometrics 1, 311\u2013341; R. V. Lenth 1989, Technometrics 31, 469\u2013473',
  },
  runOrder: {
    formula: '|r(x, order)| \u2264 0.7',
    source: 'R. A. Fisher 1935; R. Durstenfeld 1964, CACM 7, 420',
  },
  power: {
    formula: 'P(|t(df, \u03b4)| > t\u2080), \u03b4 = \u0394 / (\u03c3 \u221av)',
    source: 'N. L. Johnson, B. L. Welch 1940, Biometrika 31, 362\u2013389',
  },
  effect: {
    formula: 'effect = 2 b, b = (X\u1d40WX)\u207b\u00b9 X\u1d40W y',
    source: 'F. Yates 1937; A. S. Householder 1958, J. ACM 5, 339\u2013342 (QR)',
  },
  standardError: {
    formula: 'se = 2 s \u221a[(X\u1d40WX)\u207b\u00b9]\u2c7c\u2c7c',
    source: 'R. A. Fisher 1925',
  },
  interval: {
    formula: 'effect \u00b1 t(1 \u2212 \u03b1/2, df) se',
    source: 'J. Neyman 1937, Phil. Trans. A 236, 333\u2013380',
  },
  pIndividual: {
    formula: 'p = P(|t(df)| > |effect / se|)',
    source: 'Student 1908, Biometrika 6, 1\u201325',
  },
  pFamily: {
    formula: 'p = P(max |t\u1d62| > |effect / se|), i = 1 \u2026 m',
    source:
      'Z. \u0160id\u00e1k 1967, JASA 62, 626\u2013633; G. J. Hahn, R. W. Hendrickson 1971, Biometrika 58, 323\u2013332',
  },
  anova: {
    formula: 'F = (SS / df) / s\u00b2, SS\u2c7c = b\u2c7c\u00b2 / [(X\u1d40WX)\u207b\u00b9]\u2c7c\u2c7c',
    source: 'R. A. Fisher 1925',
  },
  lackOfFit: {
    formula: 'F = [(SS res \u2212 SS pe) / (df res \u2212 df pe)] / [SS pe / df pe]',
    source: 'R. A. Fisher 1922, JRSS 85, 597\u2013612',
  },
  curvature: {
    formula: '\u0233 corners \u2212 \u0233 centers',
    source: 'G. E. P. Box, K. B. Wilson 1951, JRSS B 13, 1\u201345',
  },
  rSquared: {
    formula:
      'R\u00b2 = 1 \u2212 SS res / SS tot; adj. 1 \u2212 (1 \u2212 R\u00b2) df tot / df res; pred. 1 \u2212 PRESS / SS tot',
    source: 'M. Ezekiel 1930; D. M. Allen 1974, Technometrics 16, 125\u2013127',
  },
  strata: {
    formula: 's\u00b2 whole = r \u03c3\u00b2 plot + \u03c3\u00b2',
    source:
      'F. Yates 1935, JRSS Suppl. 2, 181\u2013247; F. E. Satterthwaite 1946, Biometrics Bulletin 2, 110\u2013114',
  },
  counts: {
    formula: 'y = [asin \u221a(x / (n + 1)) + asin \u221a((x + 1) / (n + 1))] / 2',
    source: 'M. F. Freeman, J. W. Tukey 1950, Ann. Math. Stat. 21, 607\u2013611',
  },
  leverage: {
    formula: 'h = diag[X (X\u1d40WX)\u207b\u00b9 X\u1d40W]',
    source: 'D. C. Hoaglin, R. E. Welsch 1978, Am. Statistician 32, 17\u201322',
  },
  studentized: {
    formula: 'r = e / [s \u221a(1 \u2212 h)]; t = r \u221a[(df \u2212 1) / (df \u2212 r\u00b2)]',
    source: 'R. D. Cook, S. Weisberg 1982',
  },
  cook: {
    formula: 'D = r\u00b2 h / [p (1 \u2212 h)]',
    source: 'R. D. Cook 1977, Technometrics 19, 15\u201318',
  },
  normalScores: {
    formula: 'z\u1d62 = \u03a6\u207b\u00b9[(i \u2212 3/8) / (n + 1/4)]',
    source: 'G. Blom 1958',
  },
  halfNormal: {
    formula: 'z\u1d62 = \u03a6\u207b\u00b9[1/2 + (i \u2212 1/2) / 2m]',
    source: 'C. Daniel 1959, Technometrics 1, 311\u2013341',
  },
  lenth: {
    formula:
      's\u2080 = 1.5 med |c|; PSE = 1.5 med {|c| < 2.5 s\u2080}; ME = t(.975, m/3) PSE; SME = t(\u03b3, m/3) PSE, \u03b3 = (1 + .95^(1/m)) / 2',
    source: 'R. V. Lenth 1989, Technometrics 31, 469\u2013473',
  },
  boxCox: {
    formula:
      'y(\u03bb) = (y^\u03bb \u2212 1) / (\u03bb \u1e8f^(\u03bb\u22121)); n ln[SS(\u03bb) / SS min] \u2264 \u03c7\u00b2(.95, 1)',
    source: 'G. E. P. Box, D. R. Cox 1964, JRSS B 26, 211\u2013252',
  },
  drift: {
    formula: 'y = X b + \u03b3 \u00b7 order',
    source: 'D. R. Cox 1951, Biometrika 38, 312\u2013323',
  },
  prediction: {
    formula:
      'ci: x\u1d40b \u00b1 t s \u221a[x\u1d40(X\u1d40WX)\u207b\u00b9x]; pi: x\u1d40b \u00b1 t s \u221a[1 + x\u1d40(X\u1d40WX)\u207b\u00b9x]',
    source: 'H. Working, H. Hotelling 1929, JASA 24 (Suppl.), 73\u201385',
  },
  bestBet: {
    formula: 'E[gain | y] = \u03a3 w\u1d62 E[gain | y, \u03c3\u00b2\u1d62]',
    source: 'X. Li, N. Sudarsanam, D. D. Frey 2006, Complexity 11, 32\u201345',
  },
  gain: {
    formula: 'd = \u0233 new \u2212 \u0233 usual; d \u00b1 t(.975, df) s \u221a(1/n\u2081 + 1/n\u2082)',
    source: 'Student 1908, Biometrika 6, 1\u201325',
  },
} as const satisfies Record<string, FigureSource>;

export type FigureName = keyof typeof figureSources;
