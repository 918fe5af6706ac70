"""The rows of the table of cautions that are about an effect carried to a starting risk."""

from __future__ import annotations

from fourcount.appraisal.carrying import caution_rules as rules
from fourcount.appraisal.rule import Rule

OF_A_START: tuple[Rule, ...] = (
    Rule(
        key="effect-kept-constant",
        holds=rules.effect_kept_constant,
        source="Cochrane Handbook 5.1, 12.5.3; Kent 2018",
    ),
    Rule(
        key="effect-kept-elsewhere",
        holds=rules.kept_elsewhere,
        source="Cochrane Handbook 5.1, 12.5.3; Kent 2018",
    ),
    Rule(
        key="difference-kept-constant",
        holds=rules.difference_kept_constant,
        source="Cochrane Handbook 5.1, 9.4.4.4 (differences vary more than ratios); Deeks 2002, from memory",
    ),
    Rule(
        key="baseline-far",
        holds=rules.baseline_far,
        source="Kent 2018 and PATH 2020 (an average effect hides variation with risk); half to twice: common practice",
    ),
    Rule(
        key="constant-rates",
        holds=rules.constant_rates,
        source="common practice: a ratio of constant rates is a ratio of hazards",
    ),
    Rule(key="other-span", holds=rules.other_span, source="common practice: constant hazards"),
    Rule(
        key="solved-from-overall",
        holds=rules.solved_from_overall,
        source="common practice: the risk of all is that of the exposed and the unexposed by their shares",
    ),
    Rule(key="from-a-rate", holds=rules.from_a_rate, source="common practice: 1 - exp(-rate x time)"),
    Rule(key="baseline-uncertain", holds=rules.baseline_uncertain, source="Cochrane Handbook 5.1, 12.5.4.5"),
    Rule(key="rests-on-baseline", holds=rules.rests_on_baseline, source="Knol 2012; common practice"),
    Rule(
        key="controls-over-time",
        holds=rules.controls_over_time,
        source="Knol, Vandenbroucke and others 2008 (what case-control studies estimate), from memory",
    ),
)
"""What a starting risk assumes, and what the figures at it rest on."""

OF_AN_EFFECT: tuple[Rule, ...] = (
    Rule(
        key="within-pairs",
        holds=rules.within_pairs,
        source="Greenland, Robins and Pearl 1999 (collapsibility), from memory",
    ),
    Rule(key="adjusted-opposite", holds=rules.adjusted_opposite, source="common practice"),
    Rule(key="adjusted-turned", holds=rules.adjusted_turned, source="common practice"),
    Rule(key="carried-level", holds=rules.carried_level, source="common practice"),
    Rule(
        key="adjusted-converted",
        holds=rules.adjusted_converted,
        source="McNutt 2003",
    ),
)
"""What the effect that is carried is, and how it was taken."""
