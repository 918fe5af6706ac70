"""Risks become a plan of icons in unit coordinates. Imports nobody."""
