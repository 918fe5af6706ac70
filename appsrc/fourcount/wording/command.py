"""The words of the command in a terminal, and of the function that gives its figures to Python."""

from __future__ import annotations

HELP = """\
fourcount                              open the window
fourcount FILE                         open it on a record
fourcount answer A B C D [options]     what the four counts of one table say
fourcount answer FILE [--json]         the same for every outcome of a record
fourcount handout FILE -o OUT          one page for a patient: .pdf .png .svg
                                       (--paper a4 or letter)

A and B are people with and without the event in the index group,
C and D those in the reference group. With matched, paired or before-after
they are pairs: both sides, index side only, reference side only, neither.

options of answer:
  --design DESIGN      trial, cohort, survey, case-control, matched, paired
                       or before-after (trial)
  --level PERCENT      confidence level, 80 to 99.9 (95)
  --intervals FAMILY   score, textbook or exact (score)
  --baseline RISK      a patient's starting risk, such as 12%, '12 in 100',
                       '12% (9 to 15)' or '24 of 200'
  --low, --high RISK   a low and a high starting risk beside it
  --rate RATE          instead: '12 per 1,000 person-years', over --span
  --overall RISK --exposed SHARE
                       instead: the risk of all and the share exposed
  --effect EFFECT      the effect to carry: risk_ratio, odds_ratio,
                       risk_difference or adjusted
  --adjusted TEXT      an adjusted effect of the paper, index against
                       reference group, such as 'OR 0.49 (0.32 to 0.75)'
  --span TIME          the study's time span, such as '12 months'
  --other-span TIME    another one to carry the risks to
  --margin TEXT        a margin, such as 'RD 2% more' or 'RR 1.25'
  --matters TEXT       the smallest difference that would matter
  --welcome            the event is a good one
  --printed TEXT       what the paper prints, such as 'RR 1.50 (1.12 to 2.01)',
                       to see whether it follows from the counts
  --json               every figure by every method, for a program to read

  --version            the version of the program
  --help               this page
"""
NO_DISPLAY = "Fourcount cannot open a window: no display is there (neither DISPLAY nor WAYLAND_DISPLAY is set)."

NO_STREAM = "There is no standard output to write to."
NOT_WRITTEN = "Nothing could be written: {reason}."
UNKNOWN = "There is no {kind} {text}: try 'fourcount --help'."
TOO_MANY = "Nothing may follow {option}."
FOUR_COUNTS = "Four counts are needed after 'answer', not {number}."
NO_COUNT = "A count is empty: a whole number of people is needed, such as 38."
ONLY_THE_COUNT = "{text}: only the count itself is needed here, such as {value}."
NO_LEVEL = "The level is empty: a confidence level such as 95% is needed."
NO_VALUE = "{option} needs a value after it."
NO_FIT = "These options do not fit: {message}."

ONE_OF = "The {name} must be one of {allowed}, not {given}."
NOT_A_TRUTH = "Whether the event is unwelcome must be True or False, not {given}."
NOT_A_COUNT = "The {name} must be a whole number from 0 to {largest}, not {given}."
NOT_A_LEVEL = "The level must be a fraction from {low} to {high}, such as 0.95, not {given}."
UNUSABLE = "The {name} cannot be used: {reason}."
NO_RISK = "The {name} is empty: a risk such as 12% is needed, or none."
NOT_A_RISK = "The {name} must be a fraction from 0 to 1, or a text such as 12%, not {given}."
NOT_A_TEXT = "The {name} must be a text such as '{example}', not {given}."
ONE_START = "A starting risk, a rate and an overall risk exclude each other: give one of them."
OVERALL_AND_SHARE = "An overall risk and the share of people exposed are needed together."
ONE_LINE = "A margin and a difference that matters exclude each other: give one of them."
NOT_CARRIED = "The effect cannot be {given} here; what can be carried is {allowed}."
NO_SUCH_ARGUMENT = "answer() has no argument {name}"
ONE_RECORD = "One record at a time can be opened."
ONLY_JSON = "A file has choices of its own: only --json fits it, not {option}."
FIELDS = {
    "starting_risk_text": "baseline",
    "low_risk_text": "low risk",
    "high_risk_text": "high risk",
    "rate_text": "rate",
    "overall_risk_text": "overall risk",
    "exposed_share_text": "share exposed",
}
NAMES = {"matters": "difference that matters", "adjusted": "adjusted effect"}
"""What a sentence calls an option whose own name is no noun."""

EXAMPLES = {
    "rate": "12 per 1,000 person-years",
    "span": "12 months",
    "other span": "5 years",
    "adjusted": "OR 0.49 (0.32 to 0.75)",
    "margin": "RD 2% more",
    "matters": "RD 5 fewer per 100",
}
NOT_A_PRINT = "What is printed must be a text such as 'RR 1.50 (1.12 to 2.01)', not {given}."
HUGE = "a number as large as that"
HUGE_BELOW_ZERO = "a number as small as that"
