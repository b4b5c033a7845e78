/** The definitions of scoring, as the page states them. Formulas are LaTeX, typeset by the loader. */
export interface RuleText {
  id: string;
  title: string;
  paragraphs: string[];
  formulas: { latex: string; where?: string }[];
  sources: string[];
}

export const ruleTexts: RuleText[] = [
  {
    id: "grids",
    title: "Nodes, intervals and weights",
    paragraphs: [
      "N is the number of nodes along an axis of length L. s is the number of intervals that refinement divides: N on periodic, cell-centred and Gauss grids, N − 1 where both ends are nodes. Orders and readings use s; people are shown N. A grid in two dimensions is a tensor product, and its s is the geometric mean over the axes.",
      "The exact solution is evaluated at the exact nodes of the declared grid kind. Coordinates in a file must agree with it to 1e-8 L; only on a listed grid do the file’s own coordinates decide.",
      "Weights belong to the kind: equal on periodic and cell-centred grids, composite trapezoid on uniform ones, Clenshaw–Curtis and Fejér on Chebyshev ones, Gauss and Gauss–Lobatto on Legendre ones, cells from midpoint to midpoint on listed ones.",
    ],
    formulas: [],
    sources: [
      "Clenshaw and Curtis, Numerische Mathematik 2 (1960) 197",
      "Waldvogel, BIT Numerical Mathematics 46 (2006) 195",
    ],
  },
  {
    id: "norms",
    title: "Error norms",
    paragraphs: [
      "The error at node j is the submitted value minus the exact solution there. The norms are integrals over the domain: the grid’s weights are in them. A relative norm is divided by the same norm of the exact solution on the same nodes. For cell averages the exact solution is averaged over each cell first.",
      "Of several fields the errors are combined: sums for L1, root of the sum of squares for L2, the larger for max. Of several output times the last one is the headline.",
    ],
    formulas: [
      {
        latex:
          "\\|e\\|_1 = \\sum_j w_j |e_j|, \\qquad \\|e\\|_2 = \\Bigl(\\sum_j w_j |e_j|^2\\Bigr)^{1/2}, \\qquad \\|e\\|_\\infty = \\max_j |e_j|",
      },
      {
        latex: "E = \\frac{\\|u - u_*\\|}{\\|u_*\\|}",
        where: "Null where the norm of the exact solution is below 1e-300.",
      },
    ],
    sources: [
      "LeVeque, Finite Difference Methods for Ordinary and Partial Differential Equations, SIAM 2007, appendix A",
    ],
  },
  {
    id: "between",
    title: "Between the nodes",
    paragraphs: [
      "A submission may declare how its values are to be read between its nodes: trigonometric on periodic axes, polynomial through all nodes, or piecewise polynomial of degree 1 to 7. The reconstruction is evaluated at many more points than the finest grid has, and the same norms are taken there. Without a declaration there is no norm between nodes.",
    ],
    formulas: [],
    sources: ["Berrut and Trefethen, SIAM Review 46 (2004) 501 (the barycentric formula)"],
  },
  {
    id: "order",
    title: "Observed order",
    paragraphs: [
      "Two runs give an order. Algebraic decay keeps its order while the error falls; exponential decay has an order that grows as ln(1/E) does. The kinds are told apart by that comparison; where the evidence is not one-sided the study is called undecided. Mixed is a fast decay that ends in an algebraic one, such as a time error beneath a spectral space error.",
      "The order quoted is that of the finest pair of the straight window, with the smallest and the largest order in the window as its interval. An exponential study is quoted by its rate q, the fall of ln E for each further node.",
      "The verdict compares the order with the formal one that was declared: confirmed, near, below, above or undecidable; for a claim of exponential convergence confirmed, not exponential or undecidable. Missing evidence never becomes a pass.",
    ],
    formulas: [
      { latex: "p_k = \\frac{\\ln (E_k / E_{k+1})}{\\ln (s_{k+1} / s_k)}" },
      { latex: "E \\approx C\\,h^{p}, \\quad h = L/s \\qquad\\text{or}\\qquad E \\approx A\\,e^{-qN}" },
    ],
    sources: [
      "Roache, Journal of Fluids Engineering 124 (2002) 4",
      "Krueger, Mousseau and Hassan, Journal of Verification, Validation and Uncertainty Quantification 4 (2019) (the leading coefficient)",
    ],
  },
  {
    id: "tail",
    title: "Floor and stall",
    paragraphs: [
      "The tail are the finest runs whose error no longer falls as the steepest decay before them promised. It is a floor where its level is that of round-off, a stall where something else decides the error (time step, iteration tolerance, boundary closure), floor or stall where the level lies between, and short where the finest run alone falls short.",
    ],
    formulas: [],
    sources: [],
  },
  {
    id: "tolerance",
    title: "Nodes for a tolerance",
    paragraphs: [
      "The walk starts at the finest run, or, where the tail is a floor, at the run of smallest error. The tolerance is reached if the error there is at most the tolerance. Coarser runs are then passed while their error is at most the tolerance as well: a curve counts where it falls below and stays below.",
      "Between the last run passed and the next coarser one, ln E over ln s is interpolated by a monotone cubic on the falling stretch about them, inverted, turned back into nodes and rounded up. If the coarsest run is below already, its nodes are quoted as “at most”. In two dimensions each axis is scaled by the same ratio. Nothing is extrapolated. The curves of the charts are drawn by the same interpolant.",
    ],
    formulas: [{ latex: "N(\\tau) = \\bigl\\lceil N\\bigl(s(\\ln \\tau)\\bigr) \\bigr\\rceil" }],
    sources: ["Fritsch and Carlson, SIAM Journal on Numerical Analysis 17 (1980) 238"],
  },
  {
    id: "ranking",
    title: "Ranking",
    paragraphs: [
      "Listed submissions to the current revision of a problem are ordered by nodes for the tolerance. Equal nodes share a rank; within a tie the smaller error at the reading’s run stands first, then the earlier hand-in. Those that do not reach the tolerance follow by the error at which they stop.",
      "A study in which runs equal the exact solution on grids that cannot carry it, and a listed grid with a gap wider than 4L/N, rank between nodes only.",
    ],
    formulas: [],
    sources: ["Dolan and Moré, Mathematical Programming 91 (2002) 201 (profiles across problems)"],
  },
  {
    id: "defects",
    title: "Mass, boundary, phase and amplitude",
    paragraphs: [
      "The mass defect is the integral of the submitted field minus that of the exact solution. The boundary defect is the residual of each boundary condition, derivatives being taken by the reconstruction or by one-sided differences of sixth order.",
      "On periodic problems in one dimension the mean-square error is split into dissipation, an error of amplitude and mean, and dispersion, an error of phase.",
    ],
    formulas: [
      {
        latex:
          "\\overline{e^2} = \\underbrace{(\\sigma_u - \\sigma_*)^2 + (\\bar u - \\bar u_*)^2}_{\\text{dissipation}} + \\underbrace{2 (1 - \\rho)\\, \\sigma_u \\sigma_*}_{\\text{dispersion}}",
      },
    ],
    sources: ["Takacs, Monthly Weather Review 113 (1985) 1050"],
  },
  {
    id: "gci",
    title: "Grid convergence index",
    paragraphs: [
      "Of a functional of the solution, the integral of its square unless the problem says otherwise, the three finest grids give an apparent order and an uncertainty. It stands beside the true error, which the exact solution gives, so that a reader sees whether the index covered it.",
    ],
    formulas: [
      {
        latex:
          "\\mathrm{GCI} = \\frac{1.25}{r_{21}^{\\,p} - 1} \\left| \\frac{\\phi_1 - \\phi_2}{\\phi_1} \\right|",
        where: "r is the ratio of the two finest grids, p the apparent order, φ the functional.",
      },
    ],
    sources: ["Celik and others, Journal of Fluids Engineering 130 (2008) 078001"],
  },
  {
    id: "ladders",
    title: "What is not spatial",
    paragraphs: [
      "Runs on the same grid with a halved time step, or with a tighter iteration tolerance, show how much of the error is not spatial: the change of the error along the ladder over the error itself. Above 1 % it is a finding, since it shifts the observed order.",
    ],
    formulas: [],
    sources: [],
  },
  {
    id: "verified",
    title: "What a score says",
    paragraphs: [
      "The server verifies outputs: that these arrays have these errors. It does not prove that the named code made them. Files with a value that is not finite, with a wrong shape or with coordinates off the declared grid are refused with the place; nothing is truncated, padded, reshaped or guessed.",
    ],
    formulas: [],
    sources: [],
  },
];
