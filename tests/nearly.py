"""Text for readers: any at all, and text made of what they know."""

from __future__ import annotations

from hypothesis import strategies as st

PIECES = (
    "0", "1", "9", "12", "1,000", "200", ".", ",", "%", " ", "(", ")", "[", "-", "\u2013", "/", " to ", " in ", " of ",
    " per ", " a ", "year", "months", "person-", "person-years", "95% CI ", "fewer", "more", "points", "\u0663",
    "over ", "RR ", "one", "six", "\u00b7", "'", "\u202f",
)  # fmt: skip

ANY_TEXT = st.text(st.characters(exclude_categories=()), max_size=60)
NEARLY = st.lists(st.sampled_from(PIECES), max_size=14).map("".join)
