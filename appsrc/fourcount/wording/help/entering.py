"""How a table is entered: every form by its specimen, what a paste takes, how the check is read."""

from __future__ import annotations

from fourcount.wording.labels import FORMS

ENTERING = (
    (
        FORMS["events-and-others"],
        "People with the event and people without it, in each group.",
    ),
    (
        FORMS["events-of-total"],
        "People with the event and all people, in each group. One cell may hold both, as in 38/412 or 38 (9.2%).",
    ),
    (
        FORMS["percent-of-total"],
        (
            "A percentage and all people, in each group. The whole number of people that rounds to the percentage is "
            "looked for; where there are several the nearest is taken, and all are named."
        ),
    ),
    (
        FORMS["effect-only"],
        (
            "Only a result: risk ratio, odds ratio, hazard ratio, rate ratio or difference, with its limits, such as "
            "OR 0.49 (0.32 to 0.75). Say what it was adjusted for, if it was. Nothing can be checked against counts."
        ),
    ),
    (
        FORMS["pairs"],
        (
            "How many pairs have the event on both sides, on the first side only, on the second side only, and on "
            "neither. The first and the last may stay empty: the odds ratio of the pairs needs only those that differ."
        ),
    ),
    (
        FORMS["person-time"],
        "Events and person-time, in each group, with the unit of time.",
    ),
    (
        FORMS["risk-at-time"],
        (
            "A risk at a time and its limits, in each group, as a curve of survival or incidence gives it. The time "
            "goes into the field of the time span."
        ),
    ),
    (
        FORMS["strata"],
        "Several tables of one outcome, a row for each group of each stratum, with labels. They are pooled.",
    ),
    (
        "paste",
        (
            "A block from a spreadsheet or out of a PDF fills the whole table: groups down or across, with or without "
            "labels, parted by tabs, commas or several blanks, such as “38/412 (9.2%)” or “38 (9.2)” under “(n = "
            "412)”. A sentence does too: “Falls occurred in 38 of 412 patients with night lights and 70 of 409 with "
            "usual care (relative risk 0.54; 95% CI 0.37 to 0.78)”. What was understood is shown first where it could "
            "be meant otherwise, and one undo takes it all back."
        ),
    ),
    (
        "the patient’s starting risk",
        (
            "A risk, such as 12% or 12 in 100; with its limits, 12% (9 to 15); or counts, 24 of 200. A rate is typed "
            "as 12 per 1,000 person-years or 1.2% per year, and becomes a risk over the time span. An overall risk "
            "goes with the share of people who have the treatment, or the exposure, of the index group."
        ),
    ),
    (
        "a time span for the patient",
        "A span such as 5 years or 30 days. The study’s own time span has to be typed as one too.",
    ),
    (
        "your own line",
        (
            "A difference, such as 5 fewer per 100, or a ratio, such as 0.8, with its side. It may be the smallest "
            "difference that matters or a margin."
        ),
    ),
    (
        "what the paper prints",
        (
            "Type or paste the paper’s own result, such as “0.54 (0.37 to 0.78), p = 0.001”, and see whether it "
            "follows from the counts and by which method. One command shows the record by that method and level."
        ),
    ),
)
"""What to enter, by the specimen of print or the field that takes it."""
