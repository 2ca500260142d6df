// The look of what an issue says of itself, in line with the matter of the calculation.

export const ISSUE_RULES: string = `
#recheck, .issue > p, .issue > .scroll, .moves > p, .moves > .scroll { margin-left: var(--left); }
#recheck { margin-top: 1rem; font-size: .92rem; } #recheck ul { margin: .3rem 0 0; padding-left: 1.2rem; font-weight: 400; }
.issue > p, .moves > p { margin-bottom: .35rem; } .issue > .scroll, .moves > .scroll { margin-top: .9rem; }
.issue th .no, .moves th .no, .moves td .no { min-width: 1.4rem; display: inline-block; }
.issue td:last-child:not(.figures) { min-width: 9rem; }
.issue tbody th, .moves tbody th { font-weight: 500; }
@media (max-width: 46rem) { #recheck, .issue > p, .moves > p { margin-left: var(--left); } .issue > .scroll, .moves > .scroll { margin-left: .3rem; } }
@media print { .issue > .scroll, .moves > .scroll { margin-left: 0; } }
`;
