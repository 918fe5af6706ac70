"""Whether what a paper prints follows from its counts, and by which method.

Each printed figure is held against measures, methods, levels (90, 95, 99% and the printed one) and sides (groups
swapped, the other outcome counted); what reproduces its digits is told first. What needs no counts is asked of every
print: whether the limits are symmetric, and whether p goes with them.
"""

from __future__ import annotations

from dataclasses import replace
from functools import lru_cache

import msgspec

from fourcount.appraisal.appraise import appraise
from fourcount.appraisal.check.adoption import adoption
from fourcount.appraisal.check.basis import Basis, basis_of, of_counts
from fourcount.appraisal.check.other_counts import other_counts
from fourcount.appraisal.check.percentages import of_cells, of_risk
from fourcount.appraisal.check.probability import p_findings
from fourcount.appraisal.check.search import ALWAYS_TO, AS_PRINTED, Hit, search, wanted_level
from fourcount.appraisal.check.shown import Given, Shown
from fourcount.appraisal.check.vague import may_be_relative
from fourcount.appraisal.check.verdict import LAST_RESORTS, effect_findings
from fourcount.appraisal.findings.check import CheckFindings, FigureCheck, Finding
from fourcount.record.entry.printed import read_paper
from fourcount.record.entry.readings import PrintedFigure
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices

__all__ = ["check", "check_figures"]

REMEMBERED = 256


@lru_cache(maxsize=REMEMBERED)
def check(outcome: Outcome, choices: Choices) -> CheckFindings:
    """The check of all that an outcome's print says of its counts; remembered for equal arguments.

    Of a figure printed after adjustment only what needs no counts is asked. Where percentages fit several counts, those
    nearest to them are taken, and others if only these give the print.
    """
    # Only what the table gives is needed: it depends neither on the family nor on figures that may follow later.
    findings = appraise(outcome, Choices(family="score", level=choices.level), deferring=True)
    paper = read_paper(outcome.paper_text, outcome.paper_measure)
    adjusted = read_paper(outcome.adjusted_text, outcome.adjusted_measure, "adjusted_text")
    found = check_figures(paper.figures, basis_of(findings, outcome), choices)
    others = other_counts(outcome, paper.figures) if not _all_follow(found) else None
    if others is not None:
        found = check_figures(paper.figures, replace(of_counts(others.counts), adoptable=False), choices)
    alone = check_figures(tuple(_as_adjusted(figure) for figure in adjusted.figures), Basis(), choices)
    return CheckFindings(
        figures=found.figures + alone.figures,
        marks=paper.marks,
        cells=(() if others is None else (others.finding,)) + of_cells(findings.marks),
        adopt=found.adopt,
    )


def check_figures(figures: tuple[PrintedFigure, ...], basis: Basis, choices: Choices) -> CheckFindings:
    """The check of printed figures against what a table gives."""
    found = [_searched(figure, basis) for figure in figures]
    shown = Shown(family=choices.family if basis.adoptable else "", level=choices.level)
    return CheckFindings(
        figures=tuple(_checked(figure, hits, basis, shown) for figure, hits in found),
        adopt=adoption(found, choices) if basis.adoptable else None,
    )


def _all_follow(found: CheckFindings) -> bool:
    """Whether every printed figure follows as printed; nothing printed leaves nothing to look for."""
    return all(figure.findings and figure.findings[0].agrees for figure in found.figures)


def _searched(figure: PrintedFigure, basis: Basis) -> tuple[PrintedFigure, tuple[Hit, ...]]:
    """A figure and its matches; a percentage that no word calls a difference may be a relative reduction."""
    hits = search(figure, basis.candidates(figure.measure), basis.largest)
    if may_be_relative(figure) and not (hits and hits[0].rank == AS_PRINTED):
        relative = msgspec.structs.replace(figure, measure="relative_reduction")
        others = search(relative, basis.candidates("relative_reduction"), basis.largest)
        if others and others[0].rank == AS_PRINTED:
            return relative, others
    return figure, hits


def _checked(figure: PrintedFigure, hits: tuple[Hit, ...], basis: Basis, shown: Shown) -> FigureCheck:
    level = wanted_level(figure)
    if hits and hits[0].match.fit == "all":
        level = hits[0].match.level
    candidates = basis.candidates(figure.measure)
    said: tuple[Finding, ...] = ()
    if figure.estimate is not None or figure.low is not None:
        said = effect_findings(figure, hits, candidates, shown, heavy=basis.largest <= ALWAYS_TO)
    if figure.measure == "risk" and not hits:
        said = of_risk(figure, basis.groups) or said
    tests = basis.tests() if figure.p is not None else ()
    said = _with_p(said, p_findings(figure, tests, level, shown.test(basis.given)))
    return FigureCheck(
        printed=figure,
        matches=tuple(hit.match for hit in hits),
        findings=tuple(_from(basis.given, finding) for finding in said),
    )


def _from(given: Given, finding: Finding) -> Finding:
    """A finding that names what the table hands over, where that is not counts."""
    if given in ("counts", "strata"):
        return finding
    return msgspec.structs.replace(finding, facts={**finding.facts, "given": given})


def _with_p(said: tuple[Finding, ...], of_p: tuple[Finding, ...]) -> tuple[Finding, ...]:
    """The sentences about p stand behind all others but the last resort."""
    last = said[-1:] if said and said[-1].key in LAST_RESORTS else ()
    return said[: len(said) - len(last)] + of_p + last


def _as_adjusted(figure: PrintedFigure) -> PrintedFigure:
    return msgspec.structs.replace(figure, adjusted=True)
