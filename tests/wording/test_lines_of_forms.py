"""The lines of every form beyond four counts: names, units, order, what is withheld, and the numbers of the strips."""

from __future__ import annotations

import pytest

from forms import CONFOUNDED, EVERY_FORM, at_time, effect_only, paired, person_time, strata
from fourcount.appraisal.appraise import appraise
from fourcount.record.paper import Choices
from fourcount.wording.form import level_of
from fourcount.wording.lines import KINDS, measure_lines
from fourcount.wording.sentence import headline


def lines_of(outcome, choices=None):
    choices = choices or Choices()
    return {line.key: line for line in measure_lines(outcome, appraise(outcome, choices), choices)}


def texts(outcome, choices=None):
    return [
        (line.name, line.detail, line.estimate, line.interval)
        for line in lines_of(outcome, choices).values()
        if not line.withheld
    ]


def test_pairs_read_line_by_line():
    """Difference first, the odds ratio of the pairs last, each with the counts it rests on."""
    assert texts(paired()) == [
        ("Difference, paired", "per 100, score", "10.0 fewer", "2.4 to 17.4"),
        ("NNTB in the study", "over 12 months", "10", "6 to 42"),
        ("Risk, usual care", "70 of 200, score", "35.0%", "28.7 to 41.8%"),
        ("Risk, night lights", "50 of 200, score", "25.0%", "19.5 to 31.4%"),
        ("Risk ratio, paired", "200 pairs, score", "0.71", "0.55 to 0.92"),
        ("Odds ratio of the pairs", "20 to 40 pairs that differ, mid-P", "0.50", "0.29 to 0.85"),
    ]


def test_a_matched_study_has_its_odds_ratio_and_reasons():
    """It comes first, and everything else says why it is not given."""
    first, *others = lines_of(paired("matched")).values()
    assert (first.key, first.estimate) == ("pair_odds_ratio", "0.50")
    for line in others:
        assert line.withheld.startswith("A matched case-control study")
        assert (line.estimate, line.interval, line.low, line.high) == ("", "", None, None)


def test_the_pairs_that_differ_give_their_odds_ratio_alone():
    """Those that agree need not be typed, and the counts change places with the groups."""
    lines = lines_of(paired("paired", ("", 20, 40, "")))
    assert lines["pair_odds_ratio"].detail == "20 to 40 pairs that differ, mid-P"
    assert lines["pair_difference"].withheld.startswith("Only the pairs that differ")
    swapped = lines_of(paired("paired", ("", 20, 40, ""), index_group="second"))["pair_odds_ratio"]
    assert (swapped.detail, swapped.estimate) == ("40 to 20 pairs that differ, mid-P", "2.00")
    turned = lines_of(paired("paired", ("", 20, 40, ""), index_group="second", counted="right"))["pair_odds_ratio"]
    assert (turned.detail, turned.estimate) == ("20 to 40 pairs that differ, mid-P", "0.50")


def test_the_exact_family_says_what_is_approximate_in_pairs():
    """There is an exact interval of the odds ratio and of the risks, not of difference and ratio."""
    lines = lines_of(paired(), Choices(family="exact"))
    assert lines["pair_difference"].detail == "per 100, score, approximate"
    assert lines["pair_ratio"].detail == "200 pairs, score, approximate"
    assert lines["pair_odds_ratio"].detail == "20 to 40 pairs that differ, exact"
    assert lines["pair_risk_index"].detail == "50 of 200, exact"


def test_person_time_reads_line_by_line():
    """Rates in one round unit, differences with their word."""
    assert texts(person_time()) == [
        ("Rate difference", "per 1,000 person-years, score", "7.9 fewer", "3.0 to 13.1"),
        ("Rate, usual care", "per 1,000; 70 in 4,090 person-years, score", "17.1", "13.5 to 21.6"),
        ("Rate, night lights", "per 1,000; 38 in 4,120 person-years, score", "9.2", "6.7 to 12.7"),
        ("Rate ratio", "score", "0.54", "0.36 to 0.80"),
    ]


@pytest.mark.parametrize(
    ("counts", "unit", "told"),
    [
        ((38, 4120, 70, 4090), "person-years", "per 1,000 person-years"),
        ((38, 412, 70, 409), "patient years", "per 100 patient years"),
        ((38, 10, 70, 10), "person-year", "per person-year"),
        ((3, 412000, 70, 409000), "months", "per 1,000,000 months"),
        ((0, 412, 7, 409), "person-years", "per 100 person-years"),
        ((0, 412, 0, 409), "", "per 1,000 units of person-time"),
        ((38, "4,120 bed-days", 70, 4090), "", "per 1,000 bed-days"),
    ],
)
def test_rates_are_told_for_a_sensible_power_of_ten(counts, unit, told):
    """The smaller rate that is not 0 comes to one event at least; the unit is the reader's."""
    assert lines_of(person_time(counts, unit))["rate_difference"].detail == f"{told}, score"


def test_the_strips_of_rates_are_in_the_unit_that_is_shown():
    """So that their scale ends on round numbers."""
    line = lines_of(person_time())["rate_index"]
    assert line.kind == "rate"
    assert line.estimate_value == pytest.approx(38 / 4.12)
    assert lines_of(person_time())["rate_difference"].kind == "rate_difference"
    assert lines_of(person_time())["rate_ratio"].high == pytest.approx(0.798, abs=1e-3)


def test_a_rate_below_none_is_said_to_be_the_formulas():
    """Wald's limit of two events stands as papers print it, with its sign."""
    line = lines_of(person_time((2, 100, 7, 100)), Choices(family="textbook"))["rate_index"]
    assert (line.estimate, line.interval) == ("2.0", "−0.8 to 4.8")
    assert line.note == "the bare formula reaches below 0"
    assert lines_of(person_time((2, 100, 7, 100)))["rate_index"].note == ""


def test_printed_risks_keep_the_level_of_their_print():
    """The level chosen for the record does not change what was printed at another."""
    outcome, choices = at_time(level="90%"), Choices(level=0.99)
    assert texts(outcome, choices) == [
        ("Difference", "per 100, from the printed limits", "7.9 fewer", "3.3 to 12.6"),
        ("NNTB in the study", "over 12 months", "13", "8 to 31"),
        ("Risk, usual care", "over 12 months, as printed", "17.1%", "13.8 to 21.1%"),
        ("Risk, night lights", "over 12 months, as printed", "9.2%", "6.8 to 12.4%"),
        ("Risk ratio", "from the printed limits", "0.54", "0.37 to 0.78"),
    ]
    assert level_of(appraise(outcome, choices), choices) == pytest.approx(0.9)


def test_a_printed_risk_without_limits_still_says_its_difference():
    """Only the intervals are missing, with the reason."""
    lines = lines_of(at_time(("9.2%", "", "17.1%", "13.8 to 21.1")))
    assert (lines["risk_difference"].estimate, lines["risk_difference"].interval) == ("7.9 fewer", "withheld")
    assert "without its limits" in lines["risk_difference"].note


@pytest.mark.parametrize(
    ("outcome", "line"),
    [
        (effect_only(), ("Hazard ratio", "as printed", "0.72", "0.55 to 0.92")),
        (
            effect_only("odds_ratio", adjusted_for_text="age and sex"),
            ("Odds ratio", "as printed, adjusted for age and sex", "0.72", "0.55 to 0.92"),
        ),
        (effect_only("risk_ratio", "1.5"), ("Risk ratio", "as printed", "1.5", "not printed")),
        (
            effect_only("risk_difference", "-7.9% (-12.6 to -3.3)"),
            ("Risk difference", "per 100, as printed", "7.9 fewer", "3.3 to 12.6"),
        ),
        (effect_only("risk_ratio", design="survey"), ("Prevalence ratio", "as printed", "0.72", "0.55 to 0.92")),
        (effect_only("rate_ratio"), ("Rate ratio", "as printed", "0.72", "0.55 to 0.92")),
    ],
)
def test_a_printed_effect_is_the_only_line(outcome, line):
    """With its own limits, and for what it was adjusted."""
    assert texts(outcome) == [line]


@pytest.mark.parametrize(
    ("outcome", "estimate", "interval"),
    [
        (effect_only("odds_ratio", "9.7 (2.9 to 31.7)"), "9.7", "2.9 to 31.7"),
        (effect_only("odds_ratio", "12 (0.8 to 170)"), "12", "0.8 to 170"),
        (effect_only("risk_ratio", "0·540 (0·37–0·8)"), "0.540", "0.37 to 0.8"),
        (effect_only("risk_ratio", "0.5 (0.4 to 0.8)", index_group="second"), "2.00", "1.25 to 2.50"),
        (effect_only("risk_difference", "-8% (-13 to 3)"), "8 fewer", "13 fewer to 3 more"),
        (effect_only("risk_difference", "-0.079 (-0.126 to -0.033)"), "7.9 fewer", "3.3 to 12.6"),
        (effect_only("risk_ratio", "1.5, p = 0.03"), "1.5", "1.04 to 2.16"),
    ],
)
def test_what_only_the_print_gives_has_its_digits(outcome, estimate, interval):
    """No zero that the paper does not have; what is turned round or rebuilt is ours, and has our digits."""
    line = next(iter(lines_of(outcome).values()))
    assert (line.estimate, line.interval) == (estimate, interval)
    if "second" not in outcome.index_group and "rebuilt" not in line.note:
        findings = appraise(outcome, Choices())
        assert f"{estimate} " in headline(outcome, findings, Choices())
        assert interval in headline(outcome, findings, Choices())


@pytest.mark.parametrize(
    ("texts_", "estimate", "interval"),
    [
        (("9%", "6 to 12", "17%", "13 to 21"), "17%", "13 to 21%"),
        (("9%", "6 to 12", "17.0%", "13 to 21.5"), "17.0%", "13 to 21.5%"),
        (("9 (6-12)", "", "17 (13-21)", ""), "17%", "13 to 21%"),
    ],
)
def test_a_printed_risk_has_the_digits_of_its_print(texts_, estimate, interval):
    """And so has the risk of the other outcome, which it leaves."""
    line = lines_of(at_time(texts_))["risk_reference"]
    assert (line.estimate, line.interval) == (estimate, interval)
    other = lines_of(at_time(("9%", "6 to 12", "17%", "13 to 21"), counted="right"))["risk_reference"]
    assert (other.estimate, other.interval) == ("83%", "79 to 87%")


def test_a_missing_time_span_is_said_once():
    """Beside the number needed, which has no meaning without one."""
    details = [line.detail for line in lines_of(at_time(span_text="")).values()]
    assert sum("time span not given" in detail for detail in details) == 1


def test_an_interval_rebuilt_from_a_p_says_so():
    """It is approximate (Altman and Bland 2011)."""
    outcome = effect_only("risk_ratio", "1.5, p = 0.03")
    line = lines_of(outcome)["risk_ratio"]
    assert line.note.startswith("interval rebuilt from the printed p, approximate")
    assert level_of(appraise(outcome, Choices(level=0.9)), Choices(level=0.9)) == pytest.approx(0.95)


def test_a_printed_odds_ratio_is_never_a_relative_reduction():
    """Only ratios of risks or rates are turned into relative words; an odds ratio is converted at a starting risk."""
    assert lines_of(effect_only("odds_ratio", risk="12%"))["odds_ratio"].note == (
        "as a risk ratio at 12%: 0.75 (0.58 to 0.93)"
    )
    assert lines_of(effect_only())["hazard_ratio"].note == ""
    assert "relative reduction 28%" in lines_of(effect_only("risk_ratio"))["risk_ratio"].note


def test_pooled_stands_before_crude_and_strata_under_the_fold():
    """Measure by measure; each stratum has its counts, its ratio and its difference in one line."""
    lines = lines_of(strata())
    assert list(lines) == [
        "pooled_risk_difference", "number_needed", "risk_difference", "risk_reference", "risk_index",
        "pooled_risk_ratio", "risk_ratio", "pooled_odds_ratio", "odds_ratio", "stratum.0", "stratum.1",
    ]  # fmt: skip
    assert (lines["pooled_risk_ratio"].name, lines["pooled_risk_ratio"].estimate) == ("Risk ratio, pooled", "0.55")
    assert (lines["risk_ratio"].name, lines["risk_ratio"].estimate) == ("Risk ratio, crude", "0.54")
    assert lines["number_needed"].name == "NNTB, pooled"
    stratum = lines["stratum.0"]
    assert (stratum.name, stratum.detail) == ("under 65, risk ratio", "10 of 200 against 22 of 190")
    assert stratum.note == "difference 6.6 fewer per 100 (1.2 to 12.5)"
    assert [line.group for line in lines.values()] == ["main"] * 9 + ["more"] * 2


def test_where_crude_and_pooled_part_it_is_said_beside_the_pooled_one():
    """Of an odds ratio also that this needs no confounding."""
    lines = lines_of(strata(rows=CONFOUNDED))
    assert (lines["pooled_risk_ratio"].estimate, lines["risk_ratio"].estimate) == ("1.00", "2.50")
    assert lines["pooled_risk_ratio"].note == "parts from the crude one"
    assert "without any confounding" not in lines["pooled_risk_ratio"].note
    assert "without any confounding" in lines["pooled_odds_ratio"].note
    assert "parts" not in lines_of(strata())["pooled_risk_ratio"].note


def test_only_the_pooled_odds_ratio_is_converted_at_a_starting_risk():
    """The crude one is not what is carried."""
    lines = lines_of(strata(risk="12%"))
    assert lines["pooled_odds_ratio"].note.startswith("as a risk ratio at 12%: ")
    assert lines["odds_ratio"].note == ""


def test_strata_of_cases_and_controls_have_odds_only():
    """In the study and in each stratum."""
    lines = lines_of(strata("case-control"))
    assert next(iter(lines)) == "pooled_odds_ratio"
    assert lines["stratum.1"].name == "65 and over, odds ratio"
    assert lines["pooled_risk_ratio"].withheld.startswith("A case-control study")


@pytest.mark.parametrize("name", EVERY_FORM)
def test_every_line_has_a_name_a_kind_and_a_reason_or_a_figure(name):
    """Nothing is blank once a table is whole."""
    for line in lines_of(EVERY_FORM[name]).values():
        assert line.name
        assert bool(line.withheld) != bool(line.estimate)
        if not line.key.startswith("stratum."):
            assert line.kind == KINDS.get(line.key, "")


@pytest.mark.parametrize(
    "outcome",
    [paired(counts=("", "", "", "")), person_time(("", "", "", "")), at_time(("", "", "", "")), effect_only(text=""),
     strata(rows=()), effect_only(text="often")],
)  # fmt: skip
def test_an_empty_table_of_any_form_has_names_and_nothing_else(outcome):
    """A quiet page before the first number."""
    for line in lines_of(outcome).values():
        assert line.name
        assert (line.estimate, line.interval, line.note, line.withheld) == ("", "", "", "")
