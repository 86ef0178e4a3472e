material alloy { swell { dry; wet 0.8 % } }
