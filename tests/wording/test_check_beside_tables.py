"""What the check says beside whole tables, word for word: zeros, other forms, hazard ratios, p, clusters."""

from __future__ import annotations

from typing import Any

from fourcount.appraisal.check import check
from fourcount.record.outcome import CELLS, EffectOnly, EventsAndOthers, Outcome, Pairs, RiskAtTime, Table
from fourcount.record.paper import Choices
from fourcount.wording.check import check_lines

FALLS = (38, 374, 70, 339)


def lines_beside(table: Table, text: str, **rest: Any) -> list[str]:
    return [line.text for line in check_lines(check(Outcome(table=table, paper_text=text, **rest), Choices()))]


def of_four(*cells: int) -> EventsAndOthers:
    return EventsAndOthers(**dict(zip(CELLS, map(str, cells), strict=True)))


def test_a_half_that_was_added_is_named() -> None:
    """Where a count is 0 Katz and Woolf have no interval: it is Walter's, or Gart's, and the sentence says so."""
    (walter,) = lines_beside(of_four(0, 14, 117, 92), "RR 0.000 (99% CI, 0.002 to 2.212)")
    assert "by Walter adjusted log (1/2 added, since a count is 0) at 99%" in walter
    (gart,) = lines_beside(of_four(28, 14, 8, 0), "OR 0.0 (0.0 to 2.1)")
    assert "by Gart adjusted logit (1/2 added, since a count is 0) at 95%" in gart
    assert "Katz" not in walter
    assert "Woolf" not in gart


def test_forms_without_four_counts_say_what_they_have() -> None:
    """Two printed risks, or pairs, in place of the counts; a risk reduction printed without its sign is no slip."""
    risks = RiskAtTime(first_left_text="9% (6 to 12)", second_left_text="17% (13 to 21)")
    (line,) = lines_beside(risks, "8% (3 to 13)")
    assert line == (
        "8 points (3 to 13) follows from the two printed risks, printed as a reduction: 8.0 points (3.0 to 13.0) by "
        "the method shown, joining the printed limits, at 95%."
    )
    pairs = Pairs(first_left_text="14", first_right_text="5", second_left_text="2", second_right_text="22")
    (line,) = lines_beside(pairs, "difference 7.0% (-5.5 to 19.1)", design="before-after")
    assert line == (
        "7.0 points (−5.5 to 19.1) follows from the pairs: the paired difference is 6.98 points (−5.52 to 19.05) by "
        "the method shown, Newcombe hybrid score for pairs, at 95%."
    )


def test_a_hazard_ratio_beside_risks_is_a_note() -> None:
    """It cannot be worked out from them; what can is told for comparison, and a print that equals it is told too."""
    risks = RiskAtTime(first_left_text="9% (6 to 12)", second_left_text="17% (13 to 21)")
    assert lines_beside(risks, "hazard ratio, 0.52; 95% CI 0.36 to 0.76")[0] == (
        "A hazard ratio cannot be worked out from the two printed risks; the risk ratio here is 0.529 (0.335 to "
        "0.785), which need not agree."
    )
    (as_well, _) = lines_beside(of_four(*FALLS), "HR 0.54 (0.37 to 0.78)")
    assert as_well.startswith(
        "A hazard ratio cannot be worked out from the counts, but 0.54 (0.37 to 0.78) fits the risk ratio as well: "
    )


def test_one_p_has_one_paragraph() -> None:
    """Its interval and the tests are told in one sentence, and that nothing is there to hold it against in another."""
    _, line = lines_beside(of_four(*FALLS), "RR 0.54 (0.37 to 0.78), P = 0.2")
    assert line == (
        "Check p: p = 0.2 stands beside 95% limits that leave out no effect (1): the nearest test of the counts, "
        "Yates’s corrected chi-square, gives 0.0012 and the printed limits give about 0.0012. They may rest on "
        "different methods."
    )
    assert lines_beside(EffectOnly(), "OR 0.49, P = 0.3") == ["p = 0.3 cannot be checked: no limits are printed."]


def test_limits_of_another_method_are_told_behind_the_ones_on_screen() -> None:
    """What the window shows comes first, so that no second interval stands beside it unexplained."""
    pairs = Pairs(first_left_text="14", first_right_text="5", second_left_text="2", second_right_text="22")
    line = lines_beside(pairs, "difference 7.0% (-9.9 to 21.9)", design="before-after")[0]
    assert (
        "check the limits: the method shown, Newcombe hybrid score for pairs, gives −5.52 to 19.05 at 95%, and the "
        "nearest, Tango score, −6.14 to 20.93." in line
    )


def test_numbers_that_nobody_would_count_the_noughts_of() -> None:
    """Very large and very small figures of ours have a power of ten, a small p a bound, and one point is no points."""
    (large,) = lines_beside(of_four(999999, 1, 1, 9999999), "OR 3.0")
    assert "the counts give 1.00×10¹³ for the odds ratio" in large
    (p,) = lines_beside(of_four(380, 30, 30, 390), "P < 0.001")
    assert p == "p < 0.001 follows from the counts by every test here (<0.0001)."
    assert lines_beside(of_four(38, 374, 70, 339), "risk difference 1%")[0].startswith("Check 1 point: ")


def test_clusters_that_the_print_left_out_of_account() -> None:
    """The limits that fit, and those that allow for the clusters, which differ where the estimates do not."""
    (line,) = lines_beside(of_four(*FALLS), "RR 0.54 (0.37 to 0.78)", icc_text="0.02", cluster_size_text="25")
    assert line == (
        "Check the analysis: 0.54 (0.37 to 0.78) fits the risk ratio if the clusters are left out of account, 0.539 "
        "(0.372 to 0.781) by Katz log, Koopman score and 1 other method at 95%; allowing for them, it is 0.539 (0.344 "
        "to 0.841)."
    )


def test_limits_that_lie_evenly_are_a_note() -> None:
    """They confirm nothing of the counts, and so do not stand under the sign of what follows."""
    (line,) = check_lines(check(Outcome(table=EffectOnly(), paper_text="HR 0.72 (0.55 to 0.94)"), Choices()))
    assert (line.key, line.note) == ("symmetric", True)
