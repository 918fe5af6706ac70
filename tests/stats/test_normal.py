"""The normal quantile and the two-sided p."""

from __future__ import annotations

import mpmath
import pytest

from fourcount.stats.normal import quantile, two_sided_p, z_of_p


@pytest.mark.parametrize("level", [0.5, 0.8, 0.9, 0.95, 0.975, 0.99, 0.995, 0.999])
def test_quantile_has_every_digit_of_a_double(level: float) -> None:
    """The quantile is that of 50-digit arithmetic (mpmath) at the same double."""
    with mpmath.workdps(50):
        exact = float(mpmath.sqrt(2) * mpmath.erfinv(mpmath.mpf(level)))
    assert quantile(level) == pytest.approx(exact, rel=4e-16)


def test_quantile_at_95_percent_is_the_familiar_one() -> None:
    """1.96 at 95% (common practice), here with the digits that follow."""
    assert quantile(0.95) == pytest.approx(1.959963984540054, rel=1e-15)


@pytest.mark.parametrize("level", [0.0, 1.0, 95.0, -0.5])
def test_quantile_refuses_what_is_no_level(level: float) -> None:
    """A percentage in place of a fraction is an error of the caller."""
    with pytest.raises(ValueError, match="confidence level"):
        quantile(level)


@pytest.mark.parametrize("z", [0.0, 0.5, 1.0, 1.96, 5.0, 20.0, 37.0])
def test_two_sided_p_far_into_the_tail(z: float) -> None:
    """p keeps 12 digits down to 1e-299, from either side."""
    with mpmath.workdps(50):
        exact = float(mpmath.erfc(mpmath.mpf(z) / mpmath.sqrt(2)))
    assert two_sided_p(z) == pytest.approx(exact, rel=1e-12)
    assert two_sided_p(-z) == two_sided_p(z)


def test_p_and_quantile_undo_each_other() -> None:
    """The p at a level's z is what the level leaves to 1."""
    assert two_sided_p(quantile(0.99)) == pytest.approx(0.01, rel=1e-13)


@pytest.mark.parametrize("p", [1e-299, 1e-100, 1e-17, 1e-3, 0.034, 0.5, 0.97, 1 - 1e-9])
def test_a_p_far_below_what_a_level_leaves_has_its_z(p: float) -> None:
    """The p of the z is the p again, to 11 digits; from 1 - p alone a tail below 1e-16 could not be told."""
    assert z_of_p(p) > 0
    assert two_sided_p(z_of_p(p)) == pytest.approx(p, rel=1e-11)


def test_a_p_below_what_doubles_hold_in_full_has_the_z_of_the_least_one() -> None:
    """The smallest double has the z of 1e-300: nobody prints such a p, and the digits end there."""
    assert z_of_p(5e-324) == z_of_p(1e-300) == pytest.approx(37.065, abs=1e-3)


@pytest.mark.parametrize("p", [0.0, 1.0, -0.1, 3.0])
def test_z_refuses_what_is_no_p(p: float) -> None:
    """0 has no z, 1 has that of no effect: the caller says so before."""
    with pytest.raises(ValueError, match="a p lies"):
        z_of_p(p)
