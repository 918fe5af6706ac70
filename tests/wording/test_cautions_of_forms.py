"""Cautions of the forms beyond four counts, in whole sentences with their numbers."""

from __future__ import annotations

import pytest

from forms import CONFOUNDED, at_time, effect_only, of_total, paired, percent_of_total, strata
from fourcount.appraisal.appraise import appraise
from fourcount.appraisal.findings import Caution
from fourcount.record.outcome import Patient
from fourcount.record.paper import Choices
from fourcount.wording.cautions import caution_text

AT_TWELVE = Patient(starting_risk_text="12%")
RATIO_AT_TWELVE = Patient(starting_risk_text="12%", effect="risk_ratio")


def cautions_of(outcome, choices=None):
    """The texts of every caution by its key."""
    found = appraise(outcome, choices or Choices()).cautions
    return {caution.key: [caution_text(one) for one in found if one.key == caution.key] for caution in found}


@pytest.mark.parametrize(
    ("outcome", "key", "text"),
    [
        (
            strata(rows=CONFOUNDED),
            "strata-part",
            (
                "The difference is 15.0 more per 100 crude and 0.0 per 100 within strata: they differ by more than a "
                "tenth, as confounding by the strata can do."
            ),
        ),
        (
            strata(rows=(("mild", 10, 200, 30, 300), ("moderate", 15, 100, 12, 50), ("severe", 60, 100, 5, 10))),
            "strata-part",
            (
                "The difference is 8.2 more per 100 crude and 5.0 fewer per 100 within strata: they point in opposite "
                "directions, as confounding by the strata can do."
            ),
        ),
        (
            of_total(icc_text="0.02", cluster_size_text="21"),
            "cluster-corrected",
            (
                "Intervals and p rest on counts divided by the design effect of 1.40 (intracluster correlation 0.02, "
                "mean size 21); they depend on that correlation."
            ),
        ),
        (
            of_total(cluster_size_text="21"),
            "cluster-without-icc",
            (
                "Whole clusters were assigned, and intervals that take people for independent are too narrow: an "
                "intracluster correlation from 0 to 1 is needed."
            ),
        ),
        (
            of_total(first_lost_text="20", second_lost_text="10"),
            "losses-overturn",
            (
                "Those lost (30) could change whether the interval includes no effect, or its side: in the extreme "
                "against the result."
            ),
        ),
        (
            of_total(first_randomised_text="450", first_lost_text="20", second_lost_text="10"),
            "randomised-differs",
            (
                "Night lights: 450 people were randomised, while 412 are in the table and 20 are said to be lost; "
                "check who was left out."
            ),
        ),
        (
            at_time(level="90%"),
            "printed-level",
            "The intervals keep the paper’s own level of 90%; the level of 95% chosen here does not change them.",
        ),
        (
            effect_only("risk_ratio", "1.5, p = 0.03"),
            "interval-rebuilt",
            "No limits are printed; the interval is rebuilt from p = 0.030, which is approximate.",
        ),
        (
            effect_only("odds_ratio", design="cohort", adjusted_for_text="age and sex"),
            "adjusted-effect",
            (
                "A cohort study can adjust only for what it measured, here age and sex; what it did not measure may "
                "still explain it."
            ),
        ),
        (
            of_total(design="cohort", adjusted_text="0.61 (0.42 to 0.88)", adjusted_for_text="age"),
            "crude-beside-adjusted",
            "The figures of this table are crude; the paper’s own odds ratio, adjusted for age, is 0.61.",
        ),
        (
            of_total(design="cohort", adjusted_text="0.61 (0.42 to 0.88)"),
            "crude-beside-adjusted",
            "The figures of this table are crude; the paper’s own odds ratio, adjusted, is 0.61.",
        ),
        (
            strata(),
            "no-meta-analysis",
            ("This pools the 2 strata of one study. It is no meta-analysis: several studies differ in more ways."),
        ),
        (
            strata(),
            "observational",
            (
                "A cohort study does not assign its groups: pooling deals with what the strata differ in and with "
                "nothing else, and the crude figures not even with that. Other differences between the groups may "
                "explain them."
            ),
        ),
        (
            strata(adjusted_text="0.61 (0.42 to 0.88)", adjusted_for_text="age"),
            "crude-beside-adjusted",
            (
                "The figures of this table are crude, or pooled over its strata and no more; the paper’s own odds "
                "ratio, adjusted for age, is 0.61."
            ),
        ),
        (
            of_total(design="cohort", adjusted_measure="risk_difference", adjusted_text="-7.9% (-12.6 to -3.3)"),
            "crude-beside-adjusted",
            "The figures of this table are crude; the paper’s own difference, adjusted, is −7.9%.",
        ),
        (
            strata(rows=(("mild", 1, 10, 3, 10), ("severe", 40, 100, 60, 100))),
            "strata-small",
            (
                "In 1 of 2 strata fewer than 5 people are expected in a cell: the test of one odds ratio for all "
                "strata says little there, and may find differences that are not there."
            ),
        ),
        (
            paired("matched"),
            "observational",
            (
                "The pairs are alike in what they were matched for; other differences between cases and controls may "
                "explain the odds ratio."
            ),
        ),
        (
            paired("matched", patient=AT_TWELVE),
            "observational",
            (
                "The pairs are alike in what they were matched for; other differences between cases and controls may "
                "explain the odds ratio, and what is carried to 12% is adjusted for none of them."
            ),
        ),
        (
            of_total(design="case-control", patient=AT_TWELVE),
            "observational",
            (
                "A case-control study does not assign its groups: these are crude figures, the odds ratio carried to "
                "12% as well, and other differences between the groups may explain them."
            ),
        ),
        (
            of_total(design="case-control", patient=AT_TWELVE),
            "rests-on-baseline",
            (
                "Totals are those of cases and controls, as many as the study took, so that no risk follows from them: "
                "every risk, difference and number needed here rests on the starting risk of 12%, which is not from "
                "this study, and on the odds ratio being the same there."
            ),
        ),
        (
            of_total(design="cohort", adjusted_text="0.61 (0.42 to 0.88)", patient=RATIO_AT_TWELVE),
            "crude-beside-adjusted",
            (
                "The figures of this table are crude, and so is the risk ratio carried to 12%; the paper’s own odds "
                "ratio, adjusted, is 0.61, and can be carried instead."
            ),
        ),
        (
            of_total(design="cohort", adjusted_text="0.61 (0.42 to 0.88)"),
            "observational",
            (
                "A cohort study does not assign its groups, and can adjust only for what it measured: other "
                "differences between the groups may explain crude and adjusted figures alike."
            ),
        ),
        (
            effect_only("risk_ratio", risk="12%"),
            "effect-kept-elsewhere",
            "The risk ratio is assumed to be the same at 12% as in the study, whose own risk is not known here.",
        ),
        (
            percent_of_total(),
            "percent-several",
            None,
        ),
    ],
)
def test_a_caution_says_the_numbers_it_is_about(outcome, key, text):
    """Word for word where it holds; a percentage that fits one whole number alone is no caution."""
    told = cautions_of(outcome).get(key, [None])
    assert text in told


def test_a_percentage_that_fits_several_counts_is_told_shortly():
    """The counts by name stand under the table."""
    text = caution_text(
        Caution(key="percent-several", facts={"text": "9%", "counts": "36, 37, 38", "total": 412, "value": 37})
    )
    assert text == "9% fits 3 counts of 412; 37, the nearest, is taken."


@pytest.mark.parametrize(("odds", "told"), [(0.02, "p = 0.020"), (0.0004, "p < 0.001")])
def test_strata_unlike_each_other_tell_their_p(odds, told):
    """As every p is written."""
    assert told in caution_text(Caution(key="strata-unlike", facts={"p": odds}))
