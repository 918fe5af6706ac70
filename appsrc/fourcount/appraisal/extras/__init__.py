"""What stands under the fold of a table."""
