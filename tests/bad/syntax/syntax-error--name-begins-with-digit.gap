part 2nd of alloy
