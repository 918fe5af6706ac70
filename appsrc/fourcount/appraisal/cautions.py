"""The table of cautions, in the order in which they change what a reader concludes."""

from __future__ import annotations

from functools import partial

from fourcount.appraisal import caution_rules as rules
from fourcount.appraisal import confounding_rules as confounding
from fourcount.appraisal import form_caution_rules as form_rules
from fourcount.appraisal.carrying.cautions import OF_A_START, OF_AN_EFFECT
from fourcount.appraisal.case import Case
from fourcount.appraisal.findings import Caution
from fourcount.appraisal.rule import Rule
from fourcount.record.outcome import COUNTED_FORMS, FORMS, Form

__all__ = ["CAUTIONS", "Case", "Rule", "cautions_for"]

TABLES: tuple[Form, ...] = (*COUNTED_FORMS, "strata")
"""The forms that give four counts."""

WITHOUT_CLUSTERS: tuple[Form, ...] = ("strata", "pairs", "person-time")
"""The forms whose intervals are not corrected for clusters."""

CAUTIONS: tuple[Rule, ...] = (
    *(
        Rule(key=key, holds=partial(rules.used_though_marked, key=key), source="common practice", about_cells=True)
        for key in ("read-as", "percent-disagrees", "percent-several", "percent-none")
    ),
    Rule(key="index-looks-like-control", holds=rules.index_looks_like_control, source="common practice"),
    Rule(
        key="no-control",
        holds=form_rules.before_after,
        source="common practice: regression to the mean, time, and everything else that changed meanwhile",
    ),
    Rule(
        key="abstract-only",
        holds=form_rules.abstract_only,
        source="Boutron 2010 (abstracts tend to put results in a better light), from memory",
    ),
    Rule(
        key="cannot-be-checked",
        holds=form_rules.cannot_be_checked,
        forms=("effect-only",),
        source="common practice",
    ),
    Rule(
        key="interval-rebuilt",
        holds=form_rules.interval_rebuilt,
        forms=("effect-only",),
        source="Altman and Bland 2011, BMJ 343:d2090",
    ),
    Rule(
        key="printed-level",
        holds=form_rules.printed_level,
        forms=("effect-only", "risk-at-time"),
        source="common practice",
    ),
    Rule(
        key="concordant-unknown",
        holds=form_rules.concordant_unknown,
        forms=("pairs",),
        source="Breslow and Day 1980 (the discordant pairs alone decide the odds ratio), from memory",
    ),
    Rule(
        key="hazard-ratio",
        holds=form_rules.hazard_ratio,
        source="Hernan 2010 (the hazards of hazard ratios); Sutradhar and Austin 2018, both from memory; carried: "
        "Altman and Andersen 1999, BMJ 319:1492",
    ),
    Rule(
        key="events-counted",
        holds=form_rules.events_counted,
        forms=("person-time",),
        source="common practice: several events of one person are not independent",
    ),
    Rule(
        key="follow-up-varied",
        holds=form_rules.follow_up_varied,
        forms=(*TABLES, "pairs"),
        source="Altman and Andersen 1999 (numbers needed of outcomes in time); common practice",
    ),
    Rule(
        key="randomised-differs",
        holds=form_rules.randomised_differs,
        forms=COUNTED_FORMS,
        source="CONSORT 2010, items 13a and 16 (who was randomised and who was analysed), from memory",
    ),
    Rule(
        key="losses-overturn",
        holds=form_rules.losses_overturn,
        forms=COUNTED_FORMS,
        source="Akl 2012, BMJ 344:e2809",
    ),
    Rule(
        key="cluster-without-icc",
        holds=form_rules.cluster_without_icc,
        forms=(*COUNTED_FORMS, *WITHOUT_CLUSTERS),
        source="Cochrane Handbook 23.1",
    ),
    Rule(
        key="cluster-corrected",
        holds=form_rules.cluster_corrected,
        forms=COUNTED_FORMS,
        source="Cochrane Handbook 23.1.4",
    ),
    Rule(
        key="cluster-uncorrected",
        holds=form_rules.cluster_uncorrected,
        forms=WITHOUT_CLUSTERS,
        source="Cochrane Handbook 23.1",
    ),
    Rule(
        key="strata-part",
        holds=form_rules.strata_part,
        forms=("strata",),
        source="Greenland, Robins and Pearl 1999 (collapsibility), from memory; a tenth: common practice",
    ),
    Rule(
        key="strata-odds-ratio-parts",
        holds=form_rules.strata_odds_ratio_parts,
        forms=("strata",),
        source="Greenland, Robins and Pearl 1999 (an odds ratio may part without confounding), from memory",
    ),
    Rule(
        key="strata-unlike",
        holds=form_rules.strata_unlike,
        forms=("strata",),
        source="Breslow and Day 1980; Tarone 1985; a p below 10%: common practice",
    ),
    Rule(
        key="strata-small",
        holds=form_rules.strata_small,
        forms=("strata",),
        source="Breslow and Day 1980 (for strata of many people); Cochran 1954 (a fifth below five), from memory",
    ),
    Rule(
        key="no-meta-analysis",
        holds=form_rules.no_meta_analysis,
        forms=("strata",),
        source="Cochrane Handbook 10 (studies are pooled with regard to how they differ)",
    ),
    Rule(
        key="odds-ratio-differs",
        holds=rules.odds_ratio_differs,
        forms=TABLES,
        source="Holcomb 2001 (odds ratios read as risk ratios; the threshold of 20%); Knol 2012",
    ),
    *OF_A_START,
    Rule(
        key="totals-are-sampled",
        holds=rules.totals_are_sampled,
        forms=TABLES,
        source="Cornfield 1951 (the odds ratio alone does not depend on the sampling), from memory; common practice",
    ),
    Rule(
        key="observational",
        holds=confounding.observational,
        source="STROBE item 16a (unadjusted and confounder-adjusted estimates)",
    ),
    Rule(
        key="adjusted-effect",
        holds=confounding.adjusted_effect,
        source="STROBE item 16a; VanderWeele and Ding 2017",
    ),
    Rule(
        key="crude-beside-adjusted",
        holds=confounding.crude_beside_adjusted,
        forms=tuple(form for form in FORMS if form != "effect-only"),
        source="STROBE item 16a (unadjusted and confounder-adjusted estimates)",
    ),
    *OF_AN_EFFECT,
    Rule(key="zero-cells", holds=rules.zero_cells, forms=COUNTED_FORMS, source="Cochrane Handbook 5.1, 9.2.2.2"),
    Rule(
        key="half-added",
        holds=partial(rules.half_added, measure="risk_ratio"),
        forms=TABLES,
        source="Walter 1975; Cochrane Handbook 5.1, 9.2.2.2",
    ),
    Rule(
        key="half-added",
        holds=partial(rules.half_added, measure="odds_ratio"),
        forms=TABLES,
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
        forms=(*COUNTED_FORMS, "pairs", "person-time"),
        source="common practice: a test and an interval of different methods can differ at the border",
    ),
    Rule(
        key="rare-harm",
        holds=rules.rare_harm,
        forms=TABLES,
        source="CONSORT Harms 2022; rare as under 1%: common practice; fewer than 10 harmed: our own threshold",
    ),
    Rule(key="leans", holds=rules.leans, source="Murad 2009"),
)


def cautions_for(case: Case) -> tuple[Caution, ...]:
    """The cautions that hold, in the table's order."""
    held: list[Caution] = []
    for rule in CAUTIONS:
        asked = case.form in rule.forms and (rule.about_cells or case.figures)
        facts = rule.holds(case) if asked else None
        if facts is not None:
            several = facts if isinstance(facts, tuple) else (facts,)
            held += [Caution(key=rule.key, facts=one) for one in several]
    return tuple(held)
