//! Local date and time on the wall clock of the plant: no time zone, no summer time.

use jiff::civil::DateTime;
use jiff::{SignedDuration, Unit};

const WEEKDAYS: [&str; 7] = ["Monday", "Tuesday", "Wednesday", "Thursday", "Friday", "Saturday", "Sunday"];
const MONTHS: [&str; 12] = [
    "January",
    "February",
    "March",
    "April",
    "May",
    "June",
    "July",
    "August",
    "September",
    "October",
    "November",
    "December",
];

/// A date and time as the wall clock shows it.
///
/// A change to or from summer time in between is not counted: the clock runs on as it was set at the stop.
#[derive(Clone, Copy, Debug, PartialEq, Eq, PartialOrd, Ord)]
pub struct Clock(DateTime);

impl Clock {
    /// Reads `2026-03-01T06:00` or `2026-03-01T06:00:30`; nothing else, no time zone.
    pub fn parse(text: &str) -> Option<Self> {
        let bytes = text.as_bytes();
        let shape_holds = bytes.iter().enumerate().all(|(i, byte)| match i {
            4 | 7 => *byte == b'-',
            10 => *byte == b'T',
            13 | 16 => *byte == b':',
            _ => byte.is_ascii_digit(),
        });
        if !shape_holds || !matches!(bytes.len(), 16 | 19) {
            return None;
        }
        let second = if bytes.len() == 19 { part(text, 17, 19)? } else { 0 };
        let year = text.get(0..4)?.parse().ok()?;
        let (month, day) = (part(text, 5, 7)?, part(text, 8, 10)?);
        DateTime::new(year, month, day, part(text, 11, 13)?, part(text, 14, 16)?, second, 0).ok().map(Self)
    }

    /// The clock so many seconds later (or earlier), to the nearest minute; none beyond the years 0 to 9999.
    #[must_use]
    pub fn after(self, seconds: f64) -> Option<Self> {
        let span = SignedDuration::try_from_secs_f64(seconds).ok()?;
        let then = self.0.checked_add(span).ok()?.round(Unit::Minute).ok()?;
        (0..=9999).contains(&then.year()).then_some(Self(then))
    }

    /// "2026-03-03T14:20"; with seconds only where it has some.
    pub fn iso(self) -> String {
        let t = self.0;
        let minutes =
            format!("{:04}-{:02}-{:02}T{:02}:{:02}", t.year(), t.month(), t.day(), t.hour(), t.minute());
        if t.second() == 0 { minutes } else { format!("{minutes}:{:02}", t.second()) }
    }

    /// "Tuesday 14:20"
    pub fn weekday_time(self) -> String {
        format!("{} {}", self.weekday(), self.time())
    }

    /// "Tue 14:20"
    pub fn short(self) -> String {
        format!("{} {}", &self.weekday()[..3], self.time())
    }

    /// "Tuesday 3 March 2026, 14:20"
    pub fn date_time(self) -> String {
        let month = MONTHS[usize::from(self.0.month().unsigned_abs()) - 1];
        format!("{} {} {month} {}, {}", self.weekday(), self.0.day(), self.0.year(), self.time())
    }

    /// "3 Mar"
    pub fn day(self) -> String {
        let month = MONTHS[usize::from(self.0.month().unsigned_abs()) - 1];
        format!("{} {}", self.0.day(), &month[..3])
    }

    /// "14:20"
    pub fn hour_minute(self) -> String {
        self.time()
    }

    /// Time of day, s after midnight.
    pub fn since_midnight(self) -> f64 {
        let t = self.0;
        f64::from(t.hour()) * 3_600.0 + f64::from(t.minute()) * 60.0 + f64::from(t.second())
    }

    fn weekday(self) -> &'static str {
        WEEKDAYS[usize::from(self.0.weekday().to_monday_zero_offset().unsigned_abs())]
    }

    fn time(self) -> String {
        format!("{:02}:{:02}", self.0.hour(), self.0.minute())
    }
}

fn part(text: &str, from: usize, to: usize) -> Option<i8> {
    text.get(from..to)?.parse().ok()
}

#[cfg(test)]
mod tests {
    use super::*;

    fn clock(text: &str) -> Clock {
        Clock::parse(text).expect("a date and time")
    }

    #[test]
    fn a_stop_on_sunday_and_two_days_later_is_tuesday() {
        let ready = clock("2026-03-01T06:00").after(2.0 * 86_400.0 + 8.0 * 3_600.0 + 20.0 * 60.0).unwrap();
        assert_eq!(ready.iso(), "2026-03-03T14:20");
        assert_eq!(ready.weekday_time(), "Tuesday 14:20");
        assert_eq!(ready.short(), "Tue 14:20");
        assert_eq!(ready.date_time(), "Tuesday 3 March 2026, 14:20");
        assert_eq!(ready.hour_minute(), "14:20");
        // Whole seconds below 2^53: exact.
        assert!((ready.since_midnight() - 51_600.0).abs() < f64::EPSILON);
    }

    #[test]
    fn later_is_rounded_to_the_minute_over_any_midnight() {
        let stop = clock("2027-12-31T23:59");
        assert_eq!(stop.after(29.9).unwrap().iso(), "2027-12-31T23:59");
        assert_eq!(stop.after(30.1).unwrap().iso(), "2028-01-01T00:00");
        assert_eq!(clock("2028-02-28T12:00").after(86_400.0).unwrap().iso(), "2028-02-29T12:00");
        assert_eq!(stop.after(-86_400.0).unwrap().iso(), "2027-12-30T23:59");
    }

    #[test]
    fn seconds_are_read_and_said_again() {
        assert_eq!(clock("2026-03-01T06:00:30").iso(), "2026-03-01T06:00:30");
        assert_eq!(clock("2026-03-01T06:00:00").iso(), "2026-03-01T06:00");
    }

    #[test]
    fn what_is_no_date_and_time_is_none() {
        let wrong = [
            "",
            "2026-03-01",
            "2026-03-01 06:00",
            "2026-02-29T06:00",
            "2026-13-01T06:00",
            "2026-03-01T24:00",
            "2026-03-01T06:00Z",
            "2026-03-01T06:00+01:00",
            "2026-03-01T+6:00",
            "20é6-03-01T06:0",
            "12026-03-01T06:00",
        ];
        for text in wrong {
            assert_eq!(Clock::parse(text), None, "{text}");
        }
    }

    #[test]
    fn beyond_the_calendar_there_is_no_clock() {
        let stop = clock("2026-03-01T06:00");
        for seconds in [1e12, -1e12, 1e300, f64::INFINITY, f64::NAN] {
            assert_eq!(stop.after(seconds), None);
        }
    }
}
