"""Printed p values: by which test, from which limits, beside which interval. All tables are invented."""

from __future__ import annotations

from collections.abc import Callable
from typing import Any

import pytest

from fourcount.appraisal.check import check, check_figures
from fourcount.appraisal.check.basis import Basis, of_counts
from fourcount.appraisal.check.probability import implied_p
from fourcount.appraisal.check.symmetry import triple_of
from fourcount.appraisal.findings import Finding
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices
from fourcount.stats.entries.print_only import PRINT_TESTS
from fourcount.stats.methods import TESTS
from printed_figures import printed
from tables import counts_of

SMALL = (15, 85, 5, 95)


def about_p(found: tuple[Finding, ...]) -> list[Finding]:
    return [finding for finding in found if finding.key.startswith("p-")]


def said(figure: Any, basis: Basis | None = None) -> list[Finding]:
    return about_p(check_figures((figure,), basis or Basis(), Choices()).figures[0].findings)


@pytest.mark.parametrize("test", [*TESTS, *PRINT_TESTS], ids=lambda test: test.key)
def test_every_test_is_known_by_its_digits(test: Any) -> None:
    """The p of each test, to six decimals, is told as that test's and no other's; Yates's is among them."""
    counts = counts_of(SMALL)
    text = f"{test.p(counts):.6f}"
    (finding,) = said(printed("risk_ratio", "3.00", p=text), of_counts(counts))
    assert finding.key == "p-reproduced"
    assert finding.facts["tests"] == test.key


def test_all_tests_that_give_the_digits_are_named() -> None:
    """To three decimals several agree: each is named, the one on screen first, then the usual ones."""
    (finding,) = said(printed("risk_ratio", "0.54", p="0.001"), of_counts(counts_of((38, 374, 70, 339))))
    assert finding.facts["tests"] == ""  # every one
    (finding,) = said(printed("risk_ratio", "0.54", p="0.0008"), of_counts(counts_of((38, 374, 70, 339))))
    assert str(finding.facts["tests"]).startswith("n-minus-1 pearson")


def test_a_p_below_something_is_held_against_that() -> None:
    """p < 0.001 is right where a test gives less, and asked about where none does."""
    basis = of_counts(counts_of((38, 374, 70, 339)))
    (below,) = said(printed("risk_ratio", "0.54", p="0.001", p_relation="<"), basis)
    assert below.agrees
    (far,) = said(printed("risk_ratio", "0.54", p="0.0001", p_relation="<"), basis)
    assert (far.key, far.agrees) == ("p-differs", False)
    (above,) = said(printed("risk_ratio", "0.54", p="0.05", p_relation=">"), basis)
    assert above.key == "p-differs"


@pytest.mark.parametrize(
    ("low", "high", "p", "contradicts"),
    [
        ("0.37", "1.10", "0.03", True),
        ("0.37", "0.78", "0.03", False),
        ("0.37", "0.78", "0.20", True),
        ("0.37", "1.00", "0.03", False),  # 1.00 may be 0.996 or 1.004
        ("0.37", "1.01", "0.05", False),  # nor does 0.05 say on which side it lies
        ("0.37", "1.10", "0.20", False),
    ],
)
def test_a_p_that_disagrees_with_its_interval(low: str, high: str, p: str, contradicts: bool) -> None:
    """A p of 0.03 beside limits that hold 1, or the reverse; digits that do not tell accuse nobody."""
    found = said(printed("risk_ratio", "0.60", low, high, p=p))
    assert ("p-beside-interval" in [finding.key for finding in found]) is contradicts


def test_a_difference_has_no_effect_at_0() -> None:
    """-7.9 (-12.5 to 3.3) holds no effect."""
    figure = printed("risk_difference", "-7.9", "-12.5", "3.3", p="0.003", unit="percent")
    assert said(figure)[0].facts["inside"] == 1


def test_the_level_that_fits_decides() -> None:
    """An interval of 90% called 95% is judged at 90%: p = 0.07 beside it is no contradiction of its own."""
    counts = counts_of((20, 80, 32, 68))
    figure = printed("risk_ratio", "0.625", "0.416", "0.939", p="0.054")
    keys = [finding.key for finding in check_figures((figure,), of_counts(counts), Choices()).figures[0].findings]
    assert keys[0] == "other-level"
    assert "p-beside-interval" not in keys


def test_a_p_that_follows_from_the_limits() -> None:
    """Without counts, or after adjustment, the limits say what p should be (Altman and Bland 2011, BMJ 343:d2304)."""
    (fits,) = said(printed("hazard_ratio", "0.72", "0.55", "0.94", p="0.02"))
    assert (fits.key, fits.agrees) == ("p-from-limits", True)
    (differs,) = said(printed("hazard_ratio", "0.72", "0.55", "0.94", p="0.0001"))
    assert differs.key == "p-differs"
    assert differs.facts["implied"] == pytest.approx(0.0163, abs=0.001)


def test_the_printed_example_of_altman_and_bland() -> None:
    """A ratio of 0.81 (0.70 to 0.94) has p = 0.005; Altman and Bland 2011, BMJ 343:d2304 (from memory)."""
    triple = triple_of(printed("risk_ratio", "0.81", "0.70", "0.94"))
    assert triple is not None
    implied = implied_p(triple, 0.95)
    assert implied is not None
    assert implied.least < 0.005 < implied.most
    assert implied.likely == pytest.approx(0.005, abs=0.0006)


def test_a_p_alone_is_held_against_the_counts(study: Callable[..., Outcome]) -> None:
    """A text that prints nothing but p."""
    found = check(study(*SMALL, paper_text="p = 0.018"), Choices())
    assert [finding.key for finding in found.figures[0].findings] == ["p-reproduced"]


def test_a_p_with_nothing_beside_it() -> None:
    """Neither counts nor limits: nothing is asked."""
    (finding,) = said(printed("risk_ratio", "0.54", p="0.03"))
    assert (finding.key, finding.agrees) == ("p-unchecked", True)


def test_a_p_of_nothing_stands_for_less_than_half_its_last_digit() -> None:
    """No p is 0: "0.000" can only mean less than 0.0005, and a bare "0" says nothing that a test could give."""
    strong, weak = of_counts(counts_of((10, 90, 60, 40))), of_counts(counts_of(SMALL))
    note, source = said(printed("risk_ratio", "0.17", p="0.000"), strong)
    assert (note.key, source.key) == ("p-zero", "p-reproduced")
    note, source = said(printed("risk_ratio", "3.00", p="0"), weak)
    assert (note.key, source.key) == ("p-zero", "p-differs")


def test_tests_that_part_are_told_with_the_span_of_their_p() -> None:
    """Where several tests give the printed digits with different p, the least and the greatest are told."""
    (finding,) = said(printed("risk_ratio", "3.00", p="0.03"), of_counts(counts_of(SMALL)))
    assert len(str(finding.facts["tests"]).split()) > 1
    assert finding.facts["p"] < finding.facts["p_most"]
