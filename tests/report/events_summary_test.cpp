#include <array>
#include <sstream>

#include "rainledger/report/storm_summary.hpp"
#include "report/storm_samples.hpp"
#include "report/text_table.hpp"
#include "test.hpp"

namespace rainledger {
namespace {

using Rarities = std::vector<EventRarity>;

std::string list_of(const GaugeRecord& record, const RecordEvents& events,
                    const Rarities& rarities = {}, EventOrder order = EventOrder::time,
                    const EventRule& rule = {}) {
    return events_summary("Events of logger.csv", record, rule, events, rarities, order, {});
}

/// The numbers of the events in the order in which the list shows them.
std::vector<std::string> numbers_in(const std::string& text) {
    std::istringstream lines(text.substr(text.find("-----")));
    std::vector<std::string> numbers;
    std::string line;
    std::getline(lines, line);
    while (std::getline(lines, line) && line.starts_with("    "))
        numbers.push_back(line.substr(4, line.find(' ', 4) - 4));
    return numbers;
}

EventRarity once_in(Rarity rarity) {
    return {{{0.25, 20.0, rarity}}, 0};
}

}  // namespace

TEST_CASE("the events of a tip log, in full") {
    const std::string text = list_of(sample::tip_record(), sample::two_events());
    CHECK(text.substr(0, text.find("\nRain figures")) == R"(Events of logger.csv

Record
  2031-06-14 12:02 to 2031-06-15 08:02, 0.5 mm of rain in 2 rows of tips, 0.25 mm each

Events by time, parted by at least 6 h without rain
                                              depth    5   15   30   60  in a  5 days
  no.  start             end           lasts     mm  min  min  min  min   day  before
  -----------------------------------------------------------------------------------
    1  2031-06-14 12:00  13:00          1:00    9.0  3.0  6.0  8.0  9.0   9.0    1.2*
    2  2031-06-14 21:30  15 Jun 02:45   5:15   21.0  2.0  4.0  6.0  7.0  21.0   10.2
  2 events with 30.0 mm, and 0.8 mm outside events
  Without data and taken as dry: 30 min of event 2
  * the record begins less than five days before: more may have fallen
)");
}

TEST_CASE("with statistics the list says how rare each event was") {
    const Rarities rarities{once_in({14.2, {}, {}}), sample::rarity()};
    const std::string text = list_of(sample::tip_record(), sample::two_events(), rarities,
                                     EventOrder::depth, {6.0, 2.0});
    CHECK_THAT(text, Contains(R"(Events by depth, parted by at least 6 h with less than 2 mm of rain
                                       depth    5   15   30   60  in a  5 days    once
  no.  start             end              mm  min  min  min  min   day  before  in, yr  over
  --------------------------------------------------------------------------------------------
    2  2031-06-14 21:30  15 Jun 02:45   21.0  2.0  4.0  6.0  7.0  21.0   10.2     >100  10 min
    1  2031-06-14 12:00  13:00           9.0  3.0  6.0  8.0  9.0   9.0    1.2*      14  15 min
)") && Contains("  Rarity at the duration over which the event was rarest.\n"));
}

TEST_CASE("the return period of an event is as much as the table says") {
    const auto cells = [](Rarity rarity) {
        const Rarities rarities{once_in(rarity), once_in(rarity)};
        const std::string text = list_of(sample::tip_record(), sample::two_events(), rarities);
        const std::size_t at = text.find("1.2*") + 4;
        const std::string rest = text.substr(at, text.find('\n', at) - at);
        return rest.substr(rest.find_first_not_of(' '));
    };
    CHECK(cells({14.6, {}, {}}) == "15  15 min");
    CHECK(cells({2.34, {}, {}}) == "2.3  15 min");
    CHECK(cells({5.0, {}, {}}) == "5  15 min");
    CHECK(cells({{}, 100.0, {}}) == ">100  15 min");
    CHECK(cells({{}, {}, 2.0}) == "<2  -");
    CHECK(cells({{}, 1.0, 2.0}) == "1-2  15 min");
    CHECK(cells({}) == "-  15 min");
}

TEST_CASE("events are sorted as asked, those alike by time") {
    RecordEvents events;
    const std::vector<std::array<double, 5>> rows{// depth, 5, 15, 30 and 60 min
                                                  {10.0, 1.0, 7.0, 8.0, 9.0},
                                                  {30.0, 4.0, 5.0, 9.0, 9.0},
                                                  {20.0, 4.0, 6.0, 7.0, 9.5}};
    for (const auto& row : rows) {
        RainEvent event = sample::two_events().events[0];
        event.number = events.events.size() + 1;
        event.depth_mm = row[0];
        event.peak_mm = {row[1], row[1], row[2], row[3], row[4], row[0]};
        events.events.push_back(event);
    }
    const Rarities rarities{once_in({{}, {}, 2.0}), once_in({5.5, {}, {}}),
                            once_in({{}, 100.0, {}})};
    const auto order_by = [&](EventOrder order) {
        return numbers_in(list_of(sample::tip_record(), events, rarities, order));
    };
    using Numbers = std::vector<std::string>;
    CHECK(order_by(EventOrder::time) == Numbers{"1", "2", "3"});
    CHECK(order_by(EventOrder::depth) == Numbers{"2", "3", "1"});
    CHECK(order_by(EventOrder::peak_5) == Numbers{"2", "3", "1"});
    CHECK(order_by(EventOrder::peak_15) == Numbers{"1", "3", "2"});
    CHECK(order_by(EventOrder::peak_30) == Numbers{"2", "1", "3"});
    CHECK(order_by(EventOrder::peak_60) == Numbers{"3", "1", "2"});
    CHECK(order_by(EventOrder::rarity) == Numbers{"3", "2", "1"});
}

TEST_CASE("what was odd in a record is told in words") {
    GaugeRecord record = sample::tip_record();
    std::get<TipLog>(record.rain).clock_assumed = true;
    record.notes = {8760, 1, 20, 2, 1, 3, true};
    CHECK_THAT(
        list_of(record, sample::two_events()),
        Contains("in 8760 rows of tips, 0.25 mm each\n"
                 "  the stamps carry no zone, so the clock is assumed never to change\n"
                 "  1 tip at the instant of the tip before it: each counts\n"
                 "  20 rows of an overlapping download: dropped\n"
                 "  2 times that the clock went back: the tips keep their stamps and are put "
                 "in order\n"
                 "  1 time that the running count fell: taken as a restart from 0\n"
                 "  3 header rows in the midst: passed over\n"
                 "  a last line that was cut short: dropped\n"));
}

TEST_CASE("a record of elapsed times is listed by them") {
    GaugeRecord record;
    Hyetograph rain = make_hyetograph({0.0, 60.0, 1440.0}, "min", {21.0, 0.0});
    rain.taken_as_dry_h = 23.0;
    record.rain = rain;
    record.notes.rows = 1;
    RecordEvents events = sample::two_events();
    events.events.resize(1);
    events.events[0].from_ms = 0;
    events.events[0].to_ms = sample::kHourMs;
    CHECK_THAT(list_of(record, events),
               Contains("  0:00 to 24:00, 21.0 mm of rain in 1 row\n"
                        "  23 h 00 min of it without data, taken as dry\n") &&
                   Contains("    1  0:00   1:00   1:00    9.0  3.0") &&
                   Contains("  1 event with 9.0 mm, and 0.8 mm outside events\n"));
}

TEST_CASE("a record without events has no list") {
    CHECK_THAT(list_of(sample::tip_record(), {{}, 0.5}),
               Contains("Events by time, parted by at least 6 h without rain\n"
                        "  0 events with 0.0 mm, and 0.5 mm outside events\n\nRain figures"));
}

TEST_CASE("the widest list of events fits on a page") {
    RecordEvents events = sample::two_events();
    events.events[1].number = 149;
    events.events[1].depth_mm = 131.1;
    events.events[1].peak_mm = {18.6, 28.3, 35.0, 48.4, 61.1, 131.1};
    events.events[1].antecedent_5_day_mm = 148.8;
    const Rarities rarities{sample::rarity(), {{{0.25, 20.0, {{}, 1000.0, {}}}}, 0}};
    for (const Rarities& each : {Rarities{}, rarities}) {
        std::istringstream lines(list_of(sample::tip_record(), events, each));
        for (std::string line; std::getline(lines, line);)
            CHECK(shown_width(line) <= 100);
    }
}

}  // namespace rainledger
