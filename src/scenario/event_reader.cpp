#include <algorithm>
#include <cstdint>
#include <optional>
#include <string>
#include <utility>
#include <variant>

#include "rainledger/base/cut.hpp"
#include "rainledger/base/number.hpp"
#include "rainledger/rain/timestamp.hpp"
#include "rainledger/scenario/storm_making.hpp"
#include "scenario/gauge_clock.hpp"
#include "scenario/record_reader.hpp"
#include "scenario/shown.hpp"
#include "scenario/storm_reader.hpp"

// Rain of one event of a gauge record, or of a stretch of it.
namespace rainledger {
namespace {

constexpr double kMsPerHour = 3.6e6;
constexpr const char* kRecordExample =
    "write 'record: {file: logger.csv, tip: 0.2 mm, event: largest}'";
constexpr const char* kEventExample =
    "write 'event: largest', or an event's number by time such as 'event: 3', or 'event: {from: "
    "2031-06-14 13:00, to: 2031-06-14 18:00}'";

/// A time on the gauge's clock, where it stands.
struct Instant {
    ClockReading reading;
    YAML::Mark mark;
    std::string text;
};

struct Largest {};
struct Stretch {
    Instant from;
    Instant to;
};
/// The largest event, one by its number, or a stretch.
using EventChoice = std::variant<Largest, std::size_t, Stretch>;

std::optional<Instant> read_instant(const ClosedMap& map, std::string_view key) {
    const Entry* entry = map.require(key, key == "from" ? "2031-06-14 13:00" : "2031-06-14 18:00");
    if (entry == nullptr) return std::nullopt;
    const auto text = read_text(map.reading(), *entry, "write a date and a time, 2031-06-14 13:00");
    if (!text) return std::nullopt;
    const ParsedStamp stamp = parse_stamp(*text);
    if (stamp.value) return Instant{*stamp.value, entry->mark(), *text};
    map.reading().error(entry->mark(), std::string(key) + ": " + stamp.problem, stamp.hint);
    return std::nullopt;
}

std::optional<EventChoice> read_stretch(const Reading& reading, const Entry& entry) {
    const auto map = ClosedMap::read(reading, entry, "event", kStretchKeys, kEventExample);
    const auto from = read_instant(*map, "from");
    const auto to = read_instant(*map, "to");
    if (!from || !to) return std::nullopt;
    return Stretch{*from, *to};
}

/// A whole number from 1 on, written in digits alone.
std::optional<std::size_t> event_number(const std::string& text) {
    constexpr std::size_t kMostDigits = 9;
    if (text.empty() || text.size() > kMostDigits || text[0] == '0') return std::nullopt;
    std::size_t number = 0;
    for (const char c : text) {
        if (c < '0' || c > '9') return std::nullopt;
        number = 10 * number + static_cast<std::size_t>(c - '0');
    }
    return number;
}

std::optional<EventChoice> read_choice(const ClosedMap& map) {
    const Entry* entry = map.require("event", "largest");
    if (entry == nullptr) return std::nullopt;
    if (entry->value.IsMap()) return read_stretch(map.reading(), *entry);
    const auto text = read_text(map.reading(), *entry, kEventExample, "a word, a number or a map");
    if (!text) return std::nullopt;
    if (*text == kLargest) return Largest{};
    if (const auto number = event_number(*text)) return *number;
    const bool meant = probably_meant(*text, std::span(&kLargest, 1)).has_value();
    map.reading().error(entry->mark(), "event: " + in_quotes(*text) + " is not a choice here",
                        meant ? "write 'event: largest'" : kEventExample);
    return std::nullopt;
}

bool few_enough(const ClosedMap& map, std::size_t steps) {
    if (steps > kMostEventSteps) refuse_steps(map, "the storm");
    return steps <= kMostEventSteps;
}

/// Warns of what the record lacks in an event or before it; `name` tells the event.
void warn_of_event(const ClosedMap& map, const RainEvent& event, const std::string& name) {
    const YAML::Mark mark = map.mark_of("event");
    if (!event.antecedent_known)
        map.reading().warning(mark, name + ": " + kAntecedentUnknown, kAntecedentHint);
    if (event.without_data_h > 0.0)
        map.reading().warning(mark,
                              name + ": " + brief_time(event.without_data_h) +
                                  " without data in the record were taken as dry",
                              kNoDataHint);
}

/// The command that lists the events of a record as they are numbered here.
std::string listing(const RecordSource& source) {
    const EventRule usual;
    const bool has_blank = source.path.find(' ') != std::string::npos;
    std::string out = "rainledger storm " + (has_blank ? "\"" + source.path + "\"" : source.path);
    const auto add = [&](std::string_view option, const std::string& value) {
        out.append(" --").append(option).append(" \"").append(value).append("\"");
    };
    if (source.layout.tip_mm) add("tip", shortest(*source.layout.tip_mm) + " mm");
    if (source.rule.dry_spell_h != usual.dry_spell_h)
        add("dry-spell", shortest(source.rule.dry_spell_h) + " h");
    if (source.rule.threshold_mm != usual.threshold_mm)
        add("threshold", shortest(source.rule.threshold_mm) + " mm");
    if (source.layout.csv.zone) add("zone", *source.layout.csv.zone);
    return out + " --events";
}

/// The event chosen, or nothing after reporting.
const RainEvent* find_event(const ClosedMap& map, const EventChoice& choice,
                            const RecordEvents& events, const ReadRecord& read) {
    const auto& list = events.events;
    if (list.empty()) {
        refuse_no_event(map.reading(), map.mark_of("event"), read.record);
        return nullptr;
    }
    if (std::holds_alternative<Largest>(choice))
        return &*std::ranges::max_element(list, {}, &RainEvent::depth_mm);
    const std::size_t number = std::get<std::size_t>(choice);
    if (number <= list.size()) return &list[number - 1];
    map.reading().error(map.mark_of("event"),
                        "event: there is no event " + std::to_string(number) + "; " +
                            in_quotes(read.record.file) + " holds " + std::to_string(list.size()),
                        "they are numbered by time: '" + listing(read.source) + "' lists them");
    return nullptr;
}

std::optional<Storm> take_event(const ClosedMap& map, const EventChoice& choice,
                                const ReadRecord& read) {
    const RecordEvents events = find_events(read.record, read.source.rule, read.source.steps);
    const RainEvent* event = find_event(map, choice, events, read);
    if (event == nullptr) return std::nullopt;
    if (!few_enough(map, steps_of(read.record, *event, read.source.steps))) return std::nullopt;
    warn_of_event(map, *event, "event " + std::to_string(event->number));
    return storm_of_event(read.record, events, *event, read.source, read.table());
}

/// The instant of one end of a stretch in the record, or nothing after reporting.
std::optional<std::int64_t> locate(const ClosedMap& map, const Instant& instant,
                                   const ReadRecord& read) {
    if (instant.reading.has_offset && !has_offset(read.record)) {
        map.reading().error(instant.mark,
                            "the stamps of " + in_quotes(read.record.file) +
                                " have no UTC offset, so one cannot be matched",
                            "write the time that the gauge's clock showed, or add 'zone'");
        return std::nullopt;
    }
    const auto ms = instant_of(read.record, instant.reading, read.source.layout.csv.zone);
    if (!ms)
        map.reading().error(instant.mark,
                            in_quotes(instant.text) + " is a time that the clocks of " +
                                *read.source.layout.csv.zone + " skip",
                            "write the time before or after the change");
    return ms;
}

void warn_of_stretch(const ClosedMap& map, const Stretch& stretch, const ReadRecord& read,
                     const CutRain& taken) {
    const EventRule& rule = read.source.rule;
    const double dry_ms = rule.dry_spell_h * kMsPerHour;
    const RecordSpan span = span_of(read.record);
    const auto room = static_cast<double>(taken.event.from_ms - span.from_ms);
    const std::int64_t before =
        taken.event.from_ms - static_cast<std::int64_t>(std::min(dry_ms, room + 1.0));
    const double depth_mm = depth_between(read.record, before, taken.event.from_ms);
    if (depth_mm > 0.0 && depth_mm >= rule.threshold_mm)
        map.reading().warning(
            stretch.from.mark,
            "the stretch begins in rain: " + brief(depth_mm) + " mm fell in the " +
                brief_time(rule.dry_spell_h) + " before it",
            "a burst without the rain before it meets losses that this rain would "
            "have filled: begin earlier");
    if (!(taken.event.depth_mm > 0.0))
        map.reading().warning(stretch.from.mark, "no rain fell in the stretch",
                              "the record runs from " + clock_text(read.record, span.from_ms) +
                                  " to " + clock_text(read.record, span.to_ms));
    warn_of_event(map, taken.event, "the stretch");
}

std::optional<Storm> take_stretch(const ClosedMap& map, const Stretch& stretch,
                                  const ReadRecord& read) {
    const Reading& reading = map.reading();
    if (!is_stamped(read.record)) {
        reading.error(map.mark_of("event"),
                      in_quotes(read.record.file) + " has elapsed times, not dates",
                      "name an event: 'event: largest', or its number by time");
        return std::nullopt;
    }
    const auto from_ms = locate(map, stretch.from, read);
    const auto to_ms = locate(map, stretch.to, read);
    if (!from_ms || !to_ms) return std::nullopt;
    if (*from_ms >= *to_ms) {
        reading.error(stretch.to.mark, "'to' is not after 'from'",
                      "exchange them, or check the dates");
        return std::nullopt;
    }
    const EventSteps& steps = read.source.steps;
    if (!few_enough(map, steps_between(read.record, *from_ms, *to_ms, steps))) return std::nullopt;
    auto taken = rain_between(read.record, *from_ms, *to_ms, steps, read.source.rule);
    if (!taken) {
        const RecordSpan span = span_of(read.record);
        reading.error(map.mark_of("event"),
                      in_quotes(read.record.file) + " holds no time in this stretch",
                      "it runs from " + clock_text(read.record, span.from_ms) + " to " +
                          clock_text(read.record, span.to_ms));
        return std::nullopt;
    }
    warn_of_stretch(map, stretch, read, *taken);
    Storm storm;
    EventOrigin origin{read.source, taken->event, 0, std::nullopt};
    if (read.table() != nullptr) origin.rarity = rarity_of(taken->rain, *read.table());
    storm.origin = std::move(origin);
    storm.rain = std::move(taken->rain);
    return storm;
}

}  // namespace

std::optional<Hyetograph> read_event(const Reading& reading, const Entry& entry, Storm& storm) {
    const std::size_t errors_before = reading.diagnostics().error_count();
    const auto map = ClosedMap::read(reading, entry, "record", kRecordKeys, kRecordExample);
    if (!map) return std::nullopt;
    const auto read = read_record(*map, errors_before);
    const auto choice = read_choice(*map);
    if (!choice || !read) return std::nullopt;
    const auto* stretch = std::get_if<Stretch>(&*choice);
    auto taken =
        stretch != nullptr ? take_stretch(*map, *stretch, *read) : take_event(*map, *choice, *read);
    if (!taken) return std::nullopt;
    storm.origin = std::move(taken->origin);
    storm.file = read->record.file;
    storm.files.push_back(read->source.path);
    if (read->source.statistics_path) storm.files.push_back(*read->source.statistics_path);
    return std::move(taken->rain);
}

}  // namespace rainledger
