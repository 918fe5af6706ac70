"""The table of cautions, in the order in which they change what a reader concludes."""

from __future__ import annotations

from collections.abc import Callable
from dataclasses import dataclass
from functools import partial

from fourcount.appraisal import caution_rules as rules
from fourcount.appraisal.case import Case
from fourcount.appraisal.findings import Caution
from fourcount.record.outcome import CELLS

__all__ = ["CAUTIONS", "Case", "Rule", "cautions_for"]


@dataclass(frozen=True, kw_only=True, slots=True)
class Rule:
    """A caution: its key, when it holds (the facts for its sentence, else None), and where it comes from."""

    key: str
    holds: Callable[[Case], rules.Facts | None]
    source: str


CAUTIONS: tuple[Rule, ...] = (
    *(
        Rule(key=key, holds=partial(rules.used_though_marked, key=key, field=field), source="common practice")
        for key in ("read-as", "percent-disagrees")
        for field in CELLS
    ),
    Rule(key="index-looks-like-control", holds=rules.index_looks_like_control, source="common practice"),
    Rule(
        key="odds-ratio-differs",
        holds=rules.odds_ratio_differs,
        source="Holcomb 2001 (odds ratios read as risk ratios; the threshold of 20%); Knol 2012",
    ),
    Rule(
        key="effect-kept-constant", holds=rules.effect_kept_constant, source="Cochrane Handbook 5.1, 12.5.3; Kent 2018"
    ),
    Rule(
        key="baseline-far",
        holds=rules.baseline_far,
        source="Kent 2018 and PATH 2020 (an average effect hides variation with risk); half to twice: common practice",
    ),
    Rule(key="baseline-uncertain", holds=rules.baseline_uncertain, source="Cochrane Handbook 5.1, 12.5.4.5"),
    Rule(key="rests-on-baseline", holds=rules.rests_on_baseline, source="Knol 2012; common practice"),
    Rule(
        key="totals-are-sampled",
        holds=rules.totals_are_sampled,
        source="Cornfield 1951 (the odds ratio alone does not depend on the sampling), from memory; common practice",
    ),
    Rule(
        key="controls-over-time",
        holds=rules.controls_over_time,
        source="Knol, Vandenbroucke and others 2008 (what case-control studies estimate), from memory",
    ),
    Rule(
        key="observational",
        holds=rules.observational,
        source="STROBE item 16a (unadjusted and confounder-adjusted estimates)",
    ),
    Rule(key="converted-limits", holds=rules.converted_limits, source="McNutt 2003"),
    Rule(key="zero-cells", holds=rules.zero_cells, source="Cochrane Handbook 5.1, 9.2.2.2"),
    Rule(
        key="half-added",
        holds=partial(rules.half_added, measure="risk_ratio"),
        source="Walter 1975; Cochrane Handbook 5.1, 9.2.2.2",
    ),
    Rule(
        key="half-added",
        holds=partial(rules.half_added, measure="odds_ratio"),
        source="Gart 1966; Cochrane Handbook 5.1, 9.2.2.2",
    ),
    Rule(
        key="through-no-effect",
        holds=rules.through_no_effect,
        source="Altman and Bland 1995 (absence of evidence is not evidence of absence), from memory",
    ),
    Rule(
        key="family-parts",
        holds=rules.family_parts,
        source="common practice: a test and an interval of different methods can differ at the border",
    ),
    Rule(
        key="rare-harm",
        holds=rules.rare_harm,
        source="CONSORT Harms 2022; rare as under 1%: common practice; fewer than 10 harmed: our own threshold",
    ),
    Rule(key="leans", holds=rules.leans, source="Murad 2009"),
)


def cautions_for(case: Case) -> tuple[Caution, ...]:
    """The cautions that hold, in the table's order."""
    held = ((rule.key, rule.holds(case)) for rule in CAUTIONS)
    return tuple(Caution(key=key, facts=facts) for key, facts in held if facts is not None)
