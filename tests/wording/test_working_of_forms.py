"""The working of every form: the formula with the reader's numbers, its method, and the others."""

from __future__ import annotations

import math

import pytest

from forms import CONFOUNDED, EVERY_FORM, at_time, effect_only, of_total, paired, person_time, strata
from fourcount.appraisal.appraise import appraise
from fourcount.record.paper import Choices
from fourcount.stats.methods import FAMILIES, PAIR_FAMILIES, PAIR_TESTS, RATE_FAMILIES, RATE_TESTS, STRATA_TESTS
from fourcount.wording.extras import extra_lines
from fourcount.wording.form import measure_of
from fourcount.wording.lines import measure_lines
from fourcount.wording.working import working
from fourcount.wording.working.letters import USED
from fourcount.wording.working.parts import methods_of, table_measure


def rows_of(key, outcome, choices=None):
    choices = choices or Choices()
    return dict(working(key, outcome, appraise(outcome, choices), choices).rows)


@pytest.mark.parametrize(
    ("outcome", "key", "formula"),
    [
        (paired(), "pair_difference", "(20 − 40)/200 = −0.1000"),
        (paired(), "number_needed", "1/0.1000 = 10.00, rounded up 10"),
        (paired(), "pair_risk_index", "(30 + 20)/200 = 50/200 = 0.2500"),
        (paired(), "pair_risk_reference", "(30 + 40)/200 = 70/200 = 0.3500"),
        (paired(), "pair_ratio", "(30 + 20)/(30 + 40) = 50/70 = 0.7143"),
        (paired(), "pair_odds_ratio", "20/40 = 0.5000"),
        (paired(counts=("", 20, 40, "")), "pair_odds_ratio", "20/40 = 0.5000"),
        (person_time(), "rate_index", "38/4,120 = 0.0092"),
        (person_time(), "rate_difference", "38/4,120 − 70/4,090 = 0.0092 − 0.0171 = −0.0079"),
        (person_time(), "rate_ratio", "(38/4,120) / (70/4,090) = 0.0092 / 0.0171 = 0.5389"),
        (at_time(), "risk_difference", "0.0920 − 0.1710 = −0.0790"),
        (at_time(), "risk_ratio", "0.0920 / 0.1710 = 0.5380"),
        (strata(), "pooled_risk_ratio", "19.0992/34.8923 = 0.5474"),
        (strata(), "pooled_risk_difference", "−15.7931/205.1575 = −0.0770"),
        (strata(), "pooled_odds_ratio", "15.4167/31.2098 = 0.4940"),
        (strata(), "risk_ratio", "(38/412) / (70/409) = 0.0922 / 0.1711 = 0.5389"),
    ],
)
def test_the_formula_holds_the_readers_numbers(outcome, key, formula):
    """Each step can be checked with a pencil."""
    assert rows_of(key, outcome)["Estimate"] == formula


@pytest.mark.parametrize(
    ("outcome", "key", "formula"),
    [
        (of_total((70, 409, 38, 412), design="cohort"), "attributable_exposed", "(1.8556 − 1)/1.8556 = 0.4611"),
        (
            of_total((70, 409, 38, 412), design="cohort"),
            "attributable_population",
            "70/108 × (1.8556 − 1)/1.8556 = 0.2989",
        ),
        (of_total(design="cohort"), "prevented_exposed", "1 − 0.5389 = 0.4611"),
        (person_time(), "prevented_exposed", "1 − 0.5389 = 0.4611"),
        (strata(), "prevented_exposed", "1 − 0.5474 = 0.4526"),
    ],
)
def test_a_fraction_is_worked_out_from_its_ratio(outcome, key, formula):
    """That of the population with the share of events among the exposed before it."""
    assert rows_of(key, outcome)["Estimate"] == formula


def test_levins_limits_stand_beside_those_of_the_population_fraction():
    """Levin 1953 at the table's own exposure, 409 of 821: pe (R − 1)/(1 + pe (R − 1)) at each limit R of the ratio."""
    outcome, share = of_total((70, 409, 38, 412), design="cohort"), 409 / 821
    ratio = appraise(outcome, Choices()).measures["risk_ratio"].interval
    low, high = (100 * share * (r - 1) / (1 + share * (r - 1)) for r in (ratio.low, ratio.high))
    rows = rows_of("attributable_population", outcome)
    assert rows["Attributable fraction in the population, from a given prevalence"] == f"{low:.1f} to {high:.1f}%"


def test_a_stratum_shows_its_part_of_the_sums():
    """10 of 200 against 22 of 190: 10 × 190/390 and 22 × 200/390."""
    assert rows_of("pooled_risk_ratio", strata())["under 65"] == "a n2/N = 4.8718, c n1/N = 11.2821"


def test_two_strata_are_set_against_each_other():
    """Altman and Bland 2003: the ratio of their ratios with its interval and p, and nothing of the kind for three."""
    rows = rows_of("pooled_risk_ratio", strata())
    # Katz's errors by hand: e1² = 1/10 − 1/200 + 1/22 − 1/190, e2² = 1/28 − 1/212 + 1/48 − 1/219; 0.4318/0.6026.
    assert rows["Ratio of the two strata’s ratios"] == "0.72 (0.31 to 1.66), p = 0.44"
    between = rows_of("pooled_risk_difference", strata())["Between the two strata’s differences, per 100"]
    assert between == "2.1 more (6.8 fewer to 11.1 more), p = 0.64"
    three = (*CONFOUNDED, ("worst", 5, 10, 6, 10))
    assert "Ratio of the two strata’s ratios" not in rows_of("pooled_risk_ratio", strata(rows=three))


@pytest.mark.parametrize("name", EVERY_FORM)
def test_every_line_has_a_working_and_every_other_method_is_in_it(name):
    """Whatever can be pressed opens, and the table of methods is told in full."""
    outcome, choices = EVERY_FORM[name], Choices()
    findings = appraise(outcome, choices)
    for line in measure_lines(outcome, findings, choices):
        found = working(line.key, outcome, findings, choices)
        assert found.title == line.name
        if line.withheld:
            assert (found.sentence, found.rows) == (line.withheld, ())
            continue
        assert found.rows
        figure = measure_of(line.key, findings)
        if line.key in findings.measures and getattr(figure, "method", "printed") != "printed":
            if line.key.startswith("odds_") or line.key == "number_needed":
                continue  # they take the limits of another measure
            titles = {entry.title for entry in methods_of(table_measure(line.key, findings.form))}
            rows = dict(found.rows)
            assert titles <= {*rows, rows["Method"]}


@pytest.mark.parametrize(
    ("outcome", "tests"), [(paired(), PAIR_TESTS), (person_time(), RATE_TESTS), (strata(), STRATA_TESTS)]
)
def test_the_p_of_every_test_of_the_form_stands_together(outcome, tests):
    """With the family's own in full."""
    rows = rows_of("test", outcome)
    assert {entry.title for entry in tests} <= set(rows)
    assert rows["Formula"]
    assert rows["Source"]


def test_a_printed_effect_shows_its_text_and_what_follows_from_it():
    """Standard error, z and p by the formula of Altman and Bland."""
    rows = rows_of("hazard_ratio", effect_only())
    assert rows["As printed"] == "0.72 (0.55 to 0.92)"
    assert rows["Level"] == "The paper names no level; 95% is taken"
    assert (rows["Standard error"], rows["z"], rows["p"]) == ("0.1312", "−2.50", "0.012")
    assert "Altman and Bland 2011" in rows["Source"]
    assert rows_of("hazard_ratio", effect_only(text="0.72; 90% CI 0.55 to 0.92"))["Level"] == "90%"


def test_the_papers_own_approximations_stand_beside_the_full_normal_tail():
    """Altman and Bland 2011: exp(−0.717 z − 0.416 z²), and their worked example of 17 points with p = 0.032."""
    limits = rows_of("hazard_ratio", effect_only("hazard_ratio", "0.81 (0.70 to 0.94)"))
    assert limits["p by the approximation exp(−0.717 z − 0.416 z²)"] == "0.0051"  # e^−(2.0087 + 3.2654)
    p = rows_of("risk_difference", effect_only("risk_difference", "17%, p = 0.032"))
    assert p["Interval by the approximation zp = −0.862 + √(0.743 − 2.404 ln p)"] == "1.4 to 32.6"


def test_clusters_divide_the_counts_of_every_method():
    """The others are not told as if people were independent, and an exact one says that it cannot."""
    clustered = of_total(icc_text="0.02", cluster_size_text="21")
    rows = rows_of("risk_difference", clustered)
    assert rows["Of intervals and p, the counts divided by the design effect"] == "1.4000"
    plain = rows_of("risk_difference", of_total())
    assert (plain["Wald"], rows["Wald"]) == ("3.3 to 12.5", "2.5 to 13.3")
    assert "not whole" in rows_of("odds_ratio", clustered)["Conditional exact (Cornfield, Fisher)"]


def test_without_a_correlation_no_method_of_a_cluster_trial_is_told():
    """Nor a p: all of them would be too narrow."""
    clustered = of_total(cluster_size_text="21")
    assert "Wald" not in rows_of("risk_difference", clustered)
    assert not rows_of("test", clustered)


def test_every_extra_has_a_working():
    """Its formula, its source, the reader's numbers."""
    outcome = of_total(first_lost_text="20", second_lost_text="10", icc_text="0.02", cluster_size_text="21")
    choices = Choices()
    findings = appraise(outcome, choices)
    found = {
        line.key: working(line.key, outcome, findings, choices) for line in extra_lines(outcome, findings, choices)
    }
    assert dict(found["clusters"].rows)["Design effect"] == "1 + (21 − 1) × 0.02 = 1.4000"
    assert dict(found["losses.worst"].rows)["Lost, index group"] == "20"
    assert dict(found["losses.worst"].rows)["Risk, index group"] == "58/432 = 0.1343"
    assert dict(found["losses.best"].rows)["Risk, reference group"] == "80/419 = 0.1909"
    assert "Akl" in dict(found["losses.worst"].rows)["Source"]


def test_an_e_value_is_worked_out_from_its_ratio():
    """A ratio below 1 is turned over first; of a common event, an odds ratio's root is what the formula takes."""
    rows = rows_of("e_value", of_total(design="cohort"))
    assert rows["E-value"] == "1/0.5389 = 1.8556; 1.8556 + √(1.8556 × 0.8556) = 3.1157"
    common = of_total((200, 412, 100, 409), design="cohort", adjusted_text="4.00 (2.90 to 5.50)")
    converted = rows_of("e_value", common)
    assert (converted["E-value"], converted["Converted first"]) == ("2.0000 + √(2.0000 × 1.0000) = 3.4142", "√OR")


def test_a_line_that_is_not_there_has_an_empty_working():
    """A row pressed while its table changes raises nothing."""
    findings = appraise(paired(), Choices())
    for key in ("stratum.7", "e_value"):
        assert working(key, paired(), findings, Choices()).rows == ()


def test_the_pairs_that_differ_are_enough_for_every_test_of_pairs():
    """The p stands in the working whether or not the pairs that agree were typed."""
    alone, whole = paired("paired", ("", 20, 40, "")), paired("paired", (30, 20, 40, 110))
    assert rows_of("test", alone)["McNemar mid-P"] == rows_of("test", whole)["McNemar mid-P"]


LETTERED = [
    (of_total(), "risk_index", "x = 38, n = 412, p = 38/412 = 0.0922, z = 1.9600"),
    (of_total(), "risk_difference", (
        "p1 = 38/412 = 0.0922, p2 = 70/409 = 0.1711, n1 = 412, n2 = 409, N = 821, z = 1.9600"
    )),
    (paired("before-after", (14, 5, 2, 22)), "pair_difference", (
        "e = 14, f = 5, g = 2, h = 22, p1 = 19/43 = 0.4419, l1 = 0.3043, u1 = 0.5889, p2 = 16/43 = 0.3721, "
        "l2 = 0.2438, u2 = 0.5214, D = 0.0698, φ = 0.6230"
    )),
    (paired(counts=("", 20, 40, "")), "pair_odds_ratio", "f = 20, g = 40, alpha = 0.05"),
    (person_time(), "rate_index", "x = 38, t = 4,120, z = 1.9600"),
    (at_time(), "risk_difference", (
        "D = −0.0790, p1 = 0.0920, l1 = 0.0680, u1 = 0.1240, p2 = 0.1710, l2 = 0.1380, u2 = 0.2110"
    )),
    (strata(), "pooled_risk_ratio", "R = 0.5474, V = 0.0350, z = 1.9600"),
]  # fmt: skip


@pytest.mark.parametrize(("outcome", "key", "letters"), LETTERED)
def test_a_formula_s_letters_have_the_reader_s_numbers(outcome, key, letters):
    """So that whoever doubts an interval can work it out on paper."""
    rows = rows_of(key, outcome)
    assert rows["With"] == letters
    assert rows["Letters"]


def numbers_of(rows):
    """The letters with their numbers, as far as they are numbers."""
    found = {}
    for part in rows["With"].replace("−", "-").replace(",0", "0").split(", "):
        name, *_between, number = part.split(" = ")
        found[name] = float(number.replace(",", ""))
    return found


def test_the_numbers_of_the_letters_give_the_interval():
    """Newcombe's formula of pairs, Sato's and Robins, Breslow and Greenland's worked out again from what is told."""
    of = numbers_of(rows_of("pair_difference", paired("before-after", (14, 5, 2, 22))))
    below, above = of["p1"] - of["l1"], of["u2"] - of["p2"]
    low = of["D"] - math.sqrt(below**2 - 2 * of["φ"] * below * above + above**2)
    assert low == pytest.approx(-0.055, abs=5e-4)
    of = numbers_of(rows_of("pooled_risk_difference", strata()))
    assert of["D"] - of["z"] * math.sqrt((of["D"] * of["ΣP"] + of["ΣQ"]) / of["W"] ** 2) == pytest.approx(
        -0.123, abs=5e-4
    )
    of = numbers_of(rows_of("pooled_odds_ratio", strata()))
    assert of["O"] * math.exp(of["z"] * math.sqrt(of["V"])) == pytest.approx(0.76, abs=5e-3)


def test_every_method_that_a_family_shows_has_its_letters():
    """In each form and family; a method added to a family needs them too."""
    shown = {("risk", family.risk) for family in FAMILIES.values()} | {("risk", f.odds) for f in FAMILIES.values()}
    for measure in ("risk_difference", "risk_ratio", "odds_ratio"):
        shown |= {(measure, getattr(family, measure)) for family in FAMILIES.values()}
    for measure in ("difference", "ratio", "odds_ratio"):
        shown |= {(f"pair_{measure}", getattr(family, measure)) for family in PAIR_FAMILIES.values()}
    for measure in ("rate", "difference", "ratio"):
        name = measure if measure == "rate" else f"rate_{measure}"
        shown |= {(name, getattr(family, measure)) for family in RATE_FAMILIES.values()}
    assert shown <= set(USED)


@pytest.mark.parametrize("family", ["score", "textbook", "exact"])
@pytest.mark.parametrize("counts", [(0, 412, 70, 409), (38, 412, 0, 409), (0, 5, 5, 5), (5, 5, 5, 5)])
def test_letters_of_tables_with_zeros_raise_nothing(counts, family):
    """An infinite ratio stands as such, and where there is no interval there are no letters."""
    for outcome in (of_total(counts), paired(counts=counts), person_time(counts)):
        for line in measure_lines(outcome, appraise(outcome, Choices(family=family)), Choices(family=family)):
            rows = rows_of(line.key, outcome, Choices(family=family))
            assert "nan" not in rows.get("With", "")
