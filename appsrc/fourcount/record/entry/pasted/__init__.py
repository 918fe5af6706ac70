"""What a pasted block or sentence holds: the pieces that ``block`` and ``sentence`` are put together from."""
