/** The publications that the method rests on; a report lists those that it uses. */
export const publications = {
  blevins: 'Blevins, R. D. (1979). Formulas for Natural Frequency and Mode Shape. Van Nostrand Reinhold, table 8-1.',
  irvineCaughey:
    'Irvine, H. M., Caughey, T. K. (1974). The linear theory of free vibrations of a suspended cable. Proc. R. Soc. Lond. A 341, 299–315.',
  irvine: 'Irvine, H. M. (1981). Cable Structures. MIT Press.',
  wittrick:
    'Wittrick, W. H., Williams, F. W. (1971). A general algorithm for computing natural frequencies of elastic structures. Q. J. Mech. Appl. Math. 24(3), 263–284.',
  mainJones:
    'Main, J. A., Jones, N. P. (2002). Free vibrations of taut cable with attached damper. I: Linear viscous damper. J. Eng. Mech. 128(10), 1062–1071.',
  krenk: 'Krenk, S. (2000). Vibrations of a taut cable with an external damper. J. Appl. Mech. 67(4), 772–776.',
  zui: 'Zui, H., Shinke, T., Namita, Y. (1996). Practical formulas for estimation of cable tension by vibration method. J. Struct. Eng. 122(6), 651–656.',
  ren: 'Ren, W.-X., Chen, G., Hu, W.-H. (2005). Empirical formulas to estimate cable tension by cable fundamental frequency. Struct. Eng. Mech. 20(3), 363–380.',
  gum: 'JCGM 100:2008. Evaluation of measurement data: Guide to the expression of uncertainty in measurement.',
  ilac: 'ILAC-G8:09/2019. Guidelines on Decision Rules and Statements of Conformity.',
} as const;

export type Publication = keyof typeof publications;
