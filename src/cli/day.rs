//! Days of the calendar as `YYYY-MM-DD`.

/// The day in UTC.
pub(crate) fn today() -> String {
    let since = std::time::SystemTime::now().duration_since(std::time::UNIX_EPOCH);
    let seconds = since.map_or(0, |d| d.as_secs());
    of_epoch(seconds / 86_400)
}

/// The day that lies so many days after 1970-01-01, in the Gregorian calendar.
fn of_epoch(days: u64) -> String {
    // Years begin in March here, so that the leap day is the last of its year; eras of 400 years
    // have 146 097 days.
    let day = days + 719_468;
    let (era, day) = (day / 146_097, day % 146_097);
    let year = (day - day / 1460 + day / 36_524 - day / 146_096) / 365;
    let day = day - (365 * year + year / 4 - year / 100);
    let month = (5 * day + 2) / 153;
    let date = day - (153 * month + 2) / 5 + 1;
    let month = if month < 10 { month + 3 } else { month - 9 };
    let year = era * 400 + year + u64::from(month <= 2);
    format!("{year:04}-{month:02}-{date:02}")
}

/// Reads a day as the call states it.
///
/// # Errors
/// What is wrong with it.
pub(crate) fn parse(text: &str) -> Result<String, String> {
    let wrong = || "expected a day such as `2027-03-31`".to_string();
    let bytes = text.as_bytes();
    let shaped = bytes.len() == 10
        && bytes.iter().enumerate().all(|(i, b)| match i {
            4 | 7 => *b == b'-',
            _ => b.is_ascii_digit(),
        });
    if !shaped {
        return Err(wrong());
    }
    let number = |range: std::ops::Range<usize>| text[range].parse::<u32>().map_err(|_| wrong());
    let (year, month, date) = (number(0..4)?, number(5..7)?, number(8..10)?);
    let leap = year % 4 == 0 && (year % 100 != 0 || year % 400 == 0);
    let days = match month {
        2 if leap => 29,
        2 => 28,
        4 | 6 | 9 | 11 => 30,
        1..=12 => 31,
        _ => return Err(format!("there is no month {month:02}")),
    };
    if date == 0 || date > days {
        return Err(format!("month {month:02} of {year} has no day {date:02}"));
    }
    Ok(text.to_string())
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn days_of_the_epoch() {
        // Known pairs of Unix time and date: the epoch itself, the billionth second's day
        // (2001-09-09), and the leap day of a year divisible by 400.
        assert_eq!(of_epoch(0), "1970-01-01");
        assert_eq!(of_epoch(1_000_000_000 / 86_400), "2001-09-09");
        assert_eq!(of_epoch(951_782_400 / 86_400), "2000-02-29");
        assert_eq!(of_epoch(951_868_800 / 86_400), "2000-03-01");
    }

    #[test]
    fn days_that_are_none_are_refused() {
        assert_eq!(parse("2028-02-29").as_deref(), Ok("2028-02-29"));
        for text in ["2027-02-29", "2027-13-01", "2027-04-31", "2027-4-3", "tomorrow", "2027-01-00"]
        {
            assert!(parse(text).is_err(), "{text}");
        }
    }
}
