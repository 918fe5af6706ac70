"""Headlines and meanings of every form: whole people or person-time where that is honest, odds as odds."""

from __future__ import annotations

import re

import pytest

from forms import CONFOUNDED, at_time, effect_only, of_total, paired, person_time, strata
from fourcount.appraisal.appraise import appraise
from fourcount.record import editing
from fourcount.record.outcome import FORMS, Outcome, PercentOfTotal
from fourcount.record.paper import Choices
from fourcount.wording.headlines import NOW_THE_OTHER
from fourcount.wording.p_value import NOT_THE_SIZE
from fourcount.wording.sentence import headline, measure_sentence, p_sentence

NOT_OF_ODDS = re.compile(r"\b(risks?|chances?|probability|probable|likely|prevalences?)\b")
UNNAMED = dict.fromkeys(("first_label_text", "second_label_text", "left_words_text", "right_words_text"), "")
UNNAMED["span_text"] = ""
BY_HAND = "It rests on the 60 pairs that differ: in 20 the event came only {index}, in 40 only {reference}."


def said(outcome, choices=None):
    choices = choices or Choices()
    return headline(outcome, appraise(outcome, choices), choices)


ASKED = {
    "events-and-others": "Type the four counts of the table.",
    "events-of-total": "Type the four counts of the table.",
    "percent-of-total": "Type the percentage and the total of both groups.",
    "effect-only": "Type the printed effect with its limits, such as 0.54 (0.37 to 0.78).",
    "pairs": "Type how many pairs differ, either way; those that agree give risks as well.",
    "person-time": "Type the events and the person-time of both groups.",
    "risk-at-time": "Type both groups’ risks at one time, with their limits.",
    "strata": "Type the four counts of every stratum; a blank row is left out.",
}


@pytest.mark.parametrize("form", FORMS)
def test_an_empty_form_asks_for_what_it_takes(form):
    """One quiet instruction, in the words of its own grid; nothing asks for counts that nobody can type there."""
    assert said(Outcome(table=FORMS[form]())) == ASKED[form]


@pytest.mark.parametrize(
    ("outcome", "asked"),
    [
        (of_total((38, 412, "", "")), "Now the other group."),
        (Outcome(table=PercentOfTotal(second_left_text="17.1%", second_right_text="409")), NOW_THE_OTHER),
        (person_time(("", "", 70, 4090)), NOW_THE_OTHER),
        (at_time(("9.2%", "6.8 to 12.4", "", "")), NOW_THE_OTHER),
        (of_total((38, "", "", "")), "Type the four counts of the table."),
        (of_total((38, 412, 70, "")), "Type the four counts of the table."),
        (paired(counts=(30, 20, "", "")), ASKED["pairs"]),
    ],
)
def test_where_one_group_is_typed_only_the_other_is_asked_for(outcome, asked):
    """A half-filled grid needs no lesson on what it takes."""
    assert said(outcome) == asked


def meaning(key, outcome):
    return measure_sentence(key, outcome, appraise(outcome, Choices()), Choices())


@pytest.mark.parametrize(
    ("outcome", "text"),
    [
        (
            paired(),
            (
                "Of 100 people with usual care about 35 fell at least once within 12 months; of 100 with night "
                "lights about 25. That is 10 fewer, and could be as few as 2 or as many as 17 (95% interval)."
            ),
        ),
        (
            paired("before-after", first_label_text="After", second_label_text="Before"),
            (
                "Of 100 people about 35 fell at least once within 12 months before and about 25 after. That is 10 "
                "fewer, and could be as few as 2 or as many as 17 (95% interval)."
            ),
        ),
        (
            paired("before-after", (14, 5, 2, 22), **UNNAMED),
            (
                "Of 100 people about 37 had the event before and about 44 after. That is 7 more, and could be anything "
                "from 6 fewer to 19 more (95% interval)."
            ),
        ),
        (
            paired("before-after", index_group="second", first_label_text="July", second_label_text="June"),
            (
                "Of 100 people in the period “July” about 25 fell at least once within 12 months; of 100 in the period "
                "“June” about 35. That is 10 more, and could be as few as 2 or as many as 17 (95% interval)."
            ),
        ),
        (
            paired("matched", (27, 29, 3, 44), **UNNAMED),
            (
                "Within pairs, the odds that the case was exposed were 9.67 times those of the control (95% interval "
                "3.27 to 39.98). It rests on the 32 pairs that differ: in 29 only the case was exposed, in 3 only the "
                "control."
            ),
        ),
        (
            paired("matched", first_label_text="Cases", second_label_text="Controls", left_words_text="smoked"),
            (
                "Within pairs, the odds that the case smoked within 12 months were 0.50 times those of the control "
                "(95% interval 0.29 to 0.85). It rests on the 60 pairs that differ: in 20 only the case smoked, in 40 "
                "only the control."
            ),
        ),
        (
            paired("matched", first_label_text="Mothers", second_label_text="Sisters", left_words_text="smoked"),
            "Within pairs, the odds that the person in the group “Mothers” smoked within 12 months were 0.50 times "
            "those in the group “Sisters” (95% interval 0.29 to 0.85). "
            + BY_HAND.format(index="in the group “Mothers”", reference="in the group “Sisters”"),
        ),
        (
            person_time(design="trial"),
            (
                "With usual care there were 17.1 events (“fell at least once”) per 1,000 person-years; with night "
                "lights 9.2. That is 7.9 fewer, and could be as few as 3.0 or as many as 13.1 (95% interval)."
            ),
        ),
        (
            person_time((0, 4120, 3, 4090), design="trial"),
            (
                "With usual care there were 7.3 events (“fell at least once”) per 10,000 person-years; with night "
                "lights none. That is 7.3 fewer, and could be anything from 21.6 fewer to 2.0 more (95% interval)."
            ),
        ),
        (
            at_time(level="90%"),
            (
                "Of 100 people with usual care about 17 fell at least once within 12 months; of 100 with night "
                "lights about 9. That is 8 fewer, and could be as few as 3 or as many as 13 (90% interval)."
            ),
        ),
        (
            effect_only(),
            (
                "The paper prints a hazard ratio: at any moment, among people who have not had the event yet, its "
                "rate with night lights was 0.72 times that with usual care (95% interval 0.55 to 0.92). There are no "
                "counts to check it against, and it compares rates from moment to moment: it is no risk ratio."
            ),
        ),
        (
            effect_only("odds_ratio", adjusted_for_text="age"),
            (
                "The paper prints an odds ratio, adjusted for age: the odds that a person with night lights fell at "
                "least once within 12 months were 0.72 times those with usual care (95% interval 0.55 to 0.92). "
                "There are no counts to check it against, and odds are not shares of people."
            ),
        ),
        (
            effect_only("risk_ratio", index_group="second"),
            (
                "The paper prints a risk ratio, here turned round: the risk with usual care was 1.39 times that with "
                "night lights (95% interval 1.09 to 1.82). There are no counts to check it against, and by "
                "itself it does not say how large the risks are."
            ),
        ),
        (
            strata(rows=CONFOUNDED, design="trial"),
            (
                "Within strata, per 100 people as many fell at least once within 12 months with night lights as with "
                "usual care (95% interval 8.8 fewer to 8.8 more). Crude, without strata, it is 15.0 more per 100 "
                "(7.7 to 22.4)."
            ),
        ),
    ],
)
def test_what_a_form_says_in_one_sentence(outcome, text):
    """Word for word."""
    assert said(outcome) == text


@pytest.mark.parametrize(
    "outcome", [paired("matched"), effect_only("odds_ratio"), strata("case-control"), paired("matched", ("", 5, 3, ""))]
)
def test_a_headline_about_odds_speaks_of_odds_only(outcome):
    """Cochrane open learning, module 11-7: no risk, chance or probability in it."""
    text = said(outcome)
    assert "odds" in text
    assert not NOT_OF_ODDS.search(text)


def test_person_time_never_speaks_of_people():
    """A rate is no share of people."""
    assert "people" not in said(person_time())
    for key in ("rate_index", "rate_difference"):
        assert "not a share of people" in meaning(key, person_time())


def test_a_rate_ratio_names_both_rates():
    """The relative never without the absolute."""
    assert meaning("rate_ratio", person_time(design="trial")) == (
        "The rate of events with night lights was 0.54 times that with usual care (95% interval 0.36 to 0.80): a "
        "relative reduction of 46%. By itself it does not say how large the rate is: it was 17.1 with usual care and "
        "9.2 with night lights, per 1,000 person-years."
    )


def test_one_event_is_one_event():
    """Not one events."""
    assert "1 event in 10 person-years" in meaning("rate_index", person_time((1, 10, 2, 10)))


def test_a_pooled_figure_says_what_it_supposes_and_the_crude_one():
    """And of odds, that parting needs no confounding."""
    text = meaning("pooled_odds_ratio", strata(rows=CONFOUNDED))
    assert text.startswith("Within strata, the odds that a person")
    assert "it is taken to be the same in all of them" in text
    assert "Crude, without strata, it is 3.00" in text
    assert "parts from the crude one, as an odds ratio can without any confounding" in text


@pytest.mark.parametrize(
    ("outcome", "by"),
    [
        (paired(), "p = 0.0099, two-sided (McNemar mid-P)."),
        (person_time(), "p = 0.0018, two-sided (score test of equal rates)."),
        (effect_only(), "p = 0.012, two-sided (worked out from the printed figures alone)."),
        (
            strata(),
            "p = 0.0010, two-sided (Cochran–Mantel–Haenszel, within strata).",
        ),
    ],
)
def test_the_p_names_its_test(outcome, by):
    """And says that it is not the size of the effect."""
    assert p_sentence(appraise(outcome, Choices())).startswith(f"{by} {NOT_THE_SIZE}")


def test_strata_say_whether_one_odds_ratio_may_hold():
    """With its test, chi-square and degrees of freedom, and that a large p shows nothing."""
    text = p_sentence(appraise(strata(), Choices()))
    assert "p = 0.53 by the Breslow–Day test with Tarone’s correction (chi-square 0.40 on 1 degree of freedom)" in text
    assert "a large one does not show it" in text


def test_printed_risks_have_no_p_and_say_why():
    """Not that four counts are missing."""
    assert p_sentence(appraise(at_time(), Choices())).startswith("Two printed risks have no p of their own")


@pytest.mark.parametrize(
    "outcome",
    [of_total((5, 50, 6, 50)), paired("before-after", (14, 5, 2, 22)), person_time((3, 100, 4, 100)),
     at_time(("9%", "6 to 20", "12%", "8 to 18"))],
)  # fmt: skip
def test_an_interval_through_no_effect_is_explained_once(outcome):
    """The headline gives both ends, and the caution what that means."""
    assert "compatible" not in said(outcome)
    assert "through-no-effect" in {caution.key for caution in appraise(outcome, Choices()).cautions}


def test_counts_of_people_followed_for_different_times_are_no_risks():
    """The headline gives the counts and no share of 100 people, as the caution does."""
    outcome = of_total(follow_up_varied=True)
    assert said(outcome) == (
        "70 of 409 people with usual care fell at least once; 38 of 412 with night lights. Follow-up varied, so these "
        "counts are no risks over 12 months."
    )
    assert "no risks." in said(of_total(follow_up_varied=True, span_text=""))
    assert "12 months" not in meaning("risk_index", outcome)
    assert "12 months" in meaning("risk_index", at_time(follow_up_varied=True))


@pytest.mark.parametrize(
    ("design", "text", "words"),
    [
        ("matched", "OR 9.7 (2.9 to 31.7)", "of the pairs: within pairs, the odds that the case was exposed were 9.7"),
        ("paired", "RD 7% (-5 to 19)", "risk difference of the pairs: per 100 people 7 more"),
        ("before-after", "RR 1.2 (0.9 to 1.6)", "risk ratio of the pairs: the risk after was 1.2 times that before"),
    ],
)
def test_a_printed_estimate_of_pairs_is_said_to_be_of_pairs(design, text, words):
    """Without counts of pairs, in the words of the design."""
    outcome = editing.in_form(editing.with_design(Outcome(), design), "effect-only")
    assert words in said(editing.edit_text(outcome, "paper_text", text))
