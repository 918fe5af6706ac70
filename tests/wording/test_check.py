"""The sentences of the check: plain, with the method named, our digits beside the printed ones, and never a verdict."""

from __future__ import annotations

import re
from typing import Any

import pytest

from fourcount.appraisal.check import check, check_figures
from fourcount.appraisal.check.basis import Basis, of_counts, of_pairs, of_rates, of_strata, of_timed
from fourcount.appraisal.check.search import has_limits
from fourcount.appraisal.findings import CheckFindings
from fourcount.record.outcome import EventsAndOthers, Outcome
from fourcount.record.paper import Choices
from fourcount.stats.entries.print_only import PRINT_METHODS, PRINT_TESTS
from fourcount.stats.entries.strata import STRATA_METHODS
from fourcount.stats.entries.timed import TIMED_METHODS
from fourcount.stats.methods import METHODS, PAIR_METHODS, PAIR_TESTS, RATE_METHODS, RATE_TESTS, STRATA_TESTS, TESTS
from fourcount.stats.results import LimitedRisk, PairCounts, Rates, TimedRisks
from fourcount.wording.check import adopt_text, check_lines, figure_lines, finding_text
from fourcount.wording.check_names import MEASURES, OR, few, inside, method_names, test_names
from fourcount.wording.check_p import P_TEXTS
from fourcount.wording.check_texts import TEXTS
from printed_figures import printed
from tables import counts_of

FALLS = (38, 374, 70, 339)
HARSH = re.compile(r"\b(error|wrong|mistake|false|fault|incorrect|fraud|misconduct|fabricat\w*|impossible)\b", re.I)
PRINTS = [
    printed("risk_ratio", "0.54", "0.37", "0.78", p="0.001"),
    printed("risk_ratio", "0.49", "0.32", "0.75", p="0.001", p_relation="<"),
    printed("risk_ratio", "1.86", "1.28", "2.69"),
    printed("risk_ratio", "0.91", "0.86", "0.96"),
    printed("risk_ratio", "0.539", "0.395", "0.735", level=0.95),
    printed("risk_ratio", "0.539", "0.395", "0.735"),
    printed("risk_ratio", "2.0"),
    printed("risk_ratio", "0.6"),
    printed("risk_ratio", "0.54", "0.37", "0.87"),
    printed("risk_ratio", "0.54", "0.31", "0.95"),
    printed("risk_ratio", "0.49", "0.21", "1.95", p="0.03"),
    printed("risk_ratio", "1.10", "0.7", "9.9"),
    printed("risk_ratio", "0.45", "0.372", "0.781"),
    printed("risk_ratio", "0.53", "0.37", "0.78", p="0.000"),
    printed("risk_ratio", "0.55", "0.38", "0.78"),
    printed("risk_ratio", "0.70", "0.41", "0.99"),
    printed("risk_ratio", "0.70", "0.80", "0.99"),
    printed("odds_ratio", "0.60", "0.41", "0.88", adjusted=True),
    printed("odds_ratio", "0.49", "0.32", "0.75", adjusted=True),
    printed("hazard_ratio", "0.72", "0.55", "0.94", p="0.02"),
    printed("hazard_ratio", "0.72", "0.55", "0.94", p="0.0001"),
    printed("rate_ratio", "0.72", "0.50", "0.78", p="0.03"),
    printed("risk_difference", "-7.9", "-12.5", "-3.3", unit="percent"),
    printed("risk_difference", "0.079"),
    printed("rate_difference", "-7.9", "-12.7", "-3.1", unit="per-1000"),
    printed("relative_reduction", "46", "22", "63", unit="percent"),
    printed("number_needed", "13", "8", "31"),
    printed("risk", "9.3", unit="percent"),
    printed("risk", "9.2", "6.8", "12.4", unit="percent"),
    printed("p", p="0.03"),
    printed("risk_ratio", "", "0.372", "0.781"),
    printed("odds_ratio", "2.05", "1.27", "3.30"),
    printed("odds_ratio", "2.05", "1.27", "inf", p="0.04"),
    printed("risk_ratio", "0.54", "0.37", "0.78", p="0.2"),
    printed("risk_ratio", "0.54", "", "0.78", p="0.2"),
    printed("risk_ratio", "", "0.37", "", p="0.2"),
    printed("risk_difference", "7.9", "3.3", "12.5", unit="percent"),
    printed("risk_difference", "7.9", "3.3", "20.5", unit="percent"),
]
BASES = {
    "counts": of_counts(counts_of(FALLS)),
    "referrals": of_counts(counts_of((847, 153, 906, 94))),
    "zeros": of_counts(counts_of((0, 10, 5, 5))),
    "nobody": of_counts(counts_of((0, 10, 0, 10))),
    "pairs": of_pairs(PairCounts(both=12, index_only=25, reference_only=10, neither=53)),
    "rates": of_rates(Rates(index_events=38, index_time=4120.0, reference_events=70, reference_time=4090.0)),
    "strata": of_strata((counts_of((10, 90, 20, 180)), counts_of((40, 60, 15, 35))), counts_of((50, 150, 35, 215))),
    "timed": of_timed(
        TimedRisks(
            index=LimitedRisk(risk=0.09, low=0.06, high=0.12),
            reference=LimitedRisk(risk=0.17, low=0.13, high=0.21),
            level=0.95,
        )
    ),
    "nothing": Basis(),
}


def found(basis: Basis) -> CheckFindings:
    return check_figures(tuple(PRINTS), basis, Choices())


@pytest.mark.parametrize("basis", BASES.values(), ids=BASES)
def test_every_sentence_is_whole_and_plain(basis: Basis) -> None:
    """A capital or the print first, one full stop last, no hole, no verdict, no key."""
    for line in check_lines(found(basis)):
        assert line.text.endswith(".")
        assert not line.text.endswith("..")
        assert "…" not in line.text
        assert "nan" not in line.text
        assert not HARSH.search(line.text), line.text
        assert not re.search(r"[{}_]|  |\ba [aeio]|-in-use", line.text), line.text
        assert len(line.text) < 420


@pytest.mark.parametrize("basis", BASES.values(), ids=BASES)
def test_what_asks_says_check_and_what_agrees_does_not(basis: Basis) -> None:
    """The word stands in each sentence that asks for something, or in the one before it."""
    for figure in found(basis).figures:
        for line in figure_lines(figure):
            asks = "heck " in line.text or line.key == "also-fits"
            assert asks is not line.agrees, line.text


def test_every_finding_has_its_sentence() -> None:
    """The prints above bring out each sentence, so that none is there for nothing and none is missing."""
    said = {line.key for basis in BASES.values() for line in check_lines(found(basis))}
    in_cells = {"percent-none-of-total", "percent-other-count", "other-counts"}
    rare = {"estimate-other-way", "estimate-other-analysis", "estimate-other-name-and-way", "other-name-and-way"}
    assert (set(TEXTS) | set(P_TEXTS)) - said - rare == in_cells
    assert said <= set(TEXTS) | set(P_TEXTS)


def line_of(text: str, **rest: Any) -> str:
    table = EventsAndOthers(
        first_left_text="38", first_right_text="374", second_left_text="70", second_right_text="339"
    )
    return check_lines(check(Outcome(table=table, paper_text=text, **rest), Choices()))[0].text


@pytest.mark.parametrize(
    ("text", "sentence"),
    [
        (
            "RR 0.54 (95% CI, 0.37 to 0.78)",
            (
                "0.54 (0.37 to 0.78) follows from the counts: the risk ratio is 0.539 (0.372 to 0.781) by the method "
                "shown, Miettinen–Nurminen score, or by Katz log and 1 other method, at 95%."
            ),
        ),
        (
            "RR 0.492 (95% CI, 0.323 to 0.750)",
            (
                "Check the name: 0.492 (0.323 to 0.750), printed as a risk ratio, fits the odds ratio, 0.4921 "
                "(0.3229 to 0.7499) by Woolf logit at 95%, while the risk ratio is 0.5389."
            ),
        ),
        (
            "RR 1.86 (1.28–2.69)",
            (
                "Check which way round: 1.86 (1.28 to 2.69) fits the risk ratio with the groups swapped, 1.856 "
                "(1.281 to 2.688) by Katz log at 95%, while as entered it is 0.539."
            ),
        ),
        (
            "RR 0.539 (95% CI, 0.395 to 0.735)",
            (
                "Check the level: 0.539 (0.395 to 0.735) fits the risk ratio at 90%, 0.5389 (0.3949 to 0.7354), by "
                "Katz log, while the paper says 95%."
            ),
        ),
        (
            "RR 0.54 (0.37 to 0.87)",
            (
                "Check the upper limit: Katz log, Koopman score and 1 other method at 95% give 0.781, not 0.87, while "
                "the other limit and the estimate fit; two of its digits may have changed places."
            ),
        ),
        (
            "RR 0.70 (0.41 to 0.99)",
            (
                "Check the limits: they do not lie evenly round the estimate on the log scale: 0.41 to 1.20 or 0.49 to "
                "0.99 would be even. Score, exact and profile intervals need not."
            ),
        ),
        (
            "RR 0.49 (95% CI, 0.35 to 0.70)",
            (
                "Check the name and the level: 0.49 (0.35 to 0.70), printed as a risk ratio, fits the odds ratio at "
                "90%, 0.492 (0.345 to 0.701), by Woolf logit, Miettinen–Nurminen score and 3 other methods, while the "
                "paper says 95%."
            ),
        ),
        ("9.3%", "Check the percentage: no whole number of 412 gives 9.3%; 38 of 412 is 9.22%."),
        (
            "risk difference -7.9 percentage points",
            "−7.9 points follows from the counts: the risk difference is −7.89 points.",
        ),
        (
            "RR 1.9",
            (
                "Check which way round: 1.9 fits the risk ratio with the groups swapped, 1.86, while as entered it is "
                "0.54. So few digits may fit by chance."
            ),
        ),
    ],
)
def test_what_is_said(text: str, sentence: str) -> None:
    """The first sentence of some prints, word for word."""
    assert line_of(text) == sentence


def test_a_percentage_in_a_cell() -> None:
    """Beside its count: whether another count would give it."""
    table = EventsAndOthers(
        first_left_text="38 (9.3%)", first_right_text="374", second_left_text="70 (17.4%)", second_right_text="339"
    )
    lines = check_lines(check(Outcome(table=table), Choices()))
    assert [line.text for line in lines] == [
        "Check 38 (9.3%): no whole number of 412 gives 9.3%; 38 of 412 is 9.2%.",
        "Check 70 (17.4%): 17.4% of 409 is 71, while 70 is 17.1%.",
    ]


def test_the_command_that_adopts() -> None:
    """It names family and level."""
    assert adopt_text(("textbook", 0.90)) == "Use the paper’s method: textbook, 90%"


def test_names_of_methods_and_tests() -> None:
    """Those known in print only have titles too."""
    assert method_names("risk_ratio", "katz test-based") == ["Katz log", "test-based limits"]
    assert test_names("yates rate-score") == ["Yates’s corrected chi-square", "score test of equal rates"]


def test_a_title_inside_a_sentence_begins_small_unless_it_is_a_name() -> None:
    """Every first word of a title is a name that stands here, or no name."""
    of_people = re.compile(
        "Wilson|Clopper|Wald|Agresti|Jeffreys|Newcombe|Miettinen|Koopman|Katz|Baptista|Woolf|Gart|Mee|Walter|Cornfield|"
        "Tango|Bonett|Poisson|Mantel|Fisher|Pearson|Yates|McNemar|Cochran"
    )
    entries = METHODS + PRINT_METHODS + PAIR_METHODS + RATE_METHODS + STRATA_METHODS + TIMED_METHODS
    tests = TESTS + PRINT_TESTS + PAIR_TESTS + RATE_TESTS + STRATA_TESTS
    for entry in (*entries, *tests):
        told = inside(entry.title)
        assert told[0].islower() or told[0] == "(" or of_people.match(told), told


def test_no_more_than_two_names_are_told() -> None:
    """A reader looks for one; how many others there are is said."""
    kind = ("method", "methods")
    assert few(["A", "B"], OR, kind) == "A or B"
    assert few(["A", "B", "C"], OR, kind) == "A, B and 1 other method"
    assert few(["A", "B", "C", "D"], OR, kind) == "A, B and 2 other methods"


@pytest.mark.parametrize("figure", [one for one in PRINTS if has_limits(one)], ids=lambda one: one.text)
def test_an_unknown_finding_still_says_something(figure: Any) -> None:
    """A key without a sentence asks to check the print."""
    from fourcount.appraisal.findings import Finding

    assert finding_text(Finding(key="of another version"), figure).startswith("Check ")


def test_every_measure_has_a_name() -> None:
    """No key of a measure reaches a sentence as it is."""
    for basis in BASES.values():
        for figure in found(basis).figures:
            for match in figure.matches:
                key = match.measure.removeprefix("unpaired_").removeprefix("crude_")
                assert key in MEASURES
