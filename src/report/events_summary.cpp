#include <algorithm>
#include <array>
#include <cstddef>
#include <limits>
#include <numeric>
#include <string_view>
#include <variant>

#include <fmt/core.h>

#include "rainledger/report/storm_summary.hpp"
#include "report/clock.hpp"
#include "report/rain_words.hpp"
#include "report/record_clock.hpp"
#include "report/summary_parts.hpp"
#include "report/text_table.hpp"

namespace rainledger {
namespace {

constexpr double kMsPerHour = 3600.0e3;
constexpr std::size_t kHangingIndent = 6;

/// Everything that the list of events is made from.
struct EventList {
    const GaugeRecord& record;
    const EventRule& rule;
    const RecordEvents& found;
    std::span<const EventRarity> rarities;  // empty, or one per event
    const Display& display;
};

/// A window's place in kEventWindowsMinutes.
constexpr std::size_t window_index(int minutes) {
    return static_cast<std::size_t>(std::ranges::find(kEventWindowsMinutes, minutes) -
                                    kEventWindowsMinutes.begin());
}

/// Columns of peaks in the list. The peak of 10 minutes stands in the JSON.
struct PeakColumn {
    std::string_view heading;
    std::size_t window;
};
constexpr std::array kPeakColumns{
    PeakColumn{"5|min", window_index(5)}, PeakColumn{"15|min", window_index(15)},
    PeakColumn{"30|min", window_index(30)}, PeakColumn{"60|min", window_index(60)},
    PeakColumn{"in a|day", window_index(1440)}};

const DurationRarity* rarest_of(const EventRarity& rarity) {
    return rarity.by_duration.empty() ? nullptr : &rarity.by_duration[rarity.rarest];
}

/// A number that puts rarities in order; -1 where a table says nothing.
double rarity_rank(const EventRarity& rarity) {
    const DurationRarity* rarest = rarest_of(rarity);
    if (rarest == nullptr) return -1.0;
    const Rarity& found = rarest->rarity;
    if (found.years) return *found.years;
    if (found.more_than)
        return found.less_than ? *found.more_than : std::numeric_limits<double>::infinity();
    return found.less_than ? 0.0 : -1.0;
}

/// What an event is sorted by, the largest first.
double sort_value(const EventList& list, std::size_t i, EventOrder order) {
    const RainEvent& event = list.found.events[i];
    switch (order) {
        case EventOrder::time:
            break;
        case EventOrder::depth:
            return event.depth_mm;
        case EventOrder::peak_5:
            return event.peak_mm[window_index(5)];
        case EventOrder::peak_15:
            return event.peak_mm[window_index(15)];
        case EventOrder::peak_30:
            return event.peak_mm[window_index(30)];
        case EventOrder::peak_60:
            return event.peak_mm[window_index(60)];
        case EventOrder::rarity:
            return list.rarities.empty() ? 0.0 : rarity_rank(list.rarities[i]);
    }
    return 0.0;
}

std::vector<std::size_t> sorted(const EventList& list, EventOrder order) {
    std::vector<std::size_t> rows(list.found.events.size());
    std::iota(rows.begin(), rows.end(), std::size_t{0});
    std::ranges::stable_sort(rows, [&](std::size_t a, std::size_t b) {
        return sort_value(list, a, order) > sort_value(list, b, order);
    });
    return rows;
}

std::string_view order_words(EventOrder order) {
    switch (order) {
        case EventOrder::time:
            break;
        case EventOrder::depth:
            return "by depth";
        case EventOrder::peak_5:
            return "by the heaviest 5 minutes";
        case EventOrder::peak_15:
            return "by the heaviest 15 minutes";
        case EventOrder::peak_30:
            return "by the heaviest 30 minutes";
        case EventOrder::peak_60:
            return "by the heaviest 60 minutes";
        case EventOrder::rarity:
            return "by rarity";
    }
    return "by time";
}

/// The list is as narrow as a page only if the length of an event gives way to its rarity.
TextTable headed_table(const EventList& list) {
    TextTable table;
    table.column("no.", Align::right);
    table.column("start", Align::left);
    table.column("end", Align::left);
    if (list.rarities.empty()) table.column("lasts", Align::right);
    table.column(fmt::format("depth|{}", list.display.depth_unit()), Align::point);
    for (const PeakColumn& column : kPeakColumns)
        table.column(column.heading, Align::point);
    table.column("5 days|before", Align::right);
    if (!list.rarities.empty()) {
        table.column("once|in, yr", Align::right);
        table.column("over", Align::left);
    }
    return table;
}

std::vector<std::string> cells_of(const EventList& list, std::size_t i, const RecordClock& clock) {
    const RainEvent& event = list.found.events[i];
    const Display& display = list.display;
    std::vector<std::string> cells{std::to_string(event.number), clock.full(event.from_ms),
                                   clock.brief(event.to_ms, event.from_ms)};
    if (list.rarities.empty())
        cells.push_back(
            elapsed_text(static_cast<double>(event.to_ms - event.from_ms) / kMsPerHour));
    cells.push_back(display.depth(event.depth_mm));
    for (const PeakColumn& column : kPeakColumns)
        cells.push_back(display.depth(event.peak_mm[column.window]));
    cells.push_back(display.depth(event.antecedent_5_day_mm) +
                    (event.antecedent_known ? " " : "*"));
    if (list.rarities.empty()) return cells;
    const DurationRarity* rarest = rarest_of(list.rarities[i]);
    cells.push_back(rarest == nullptr ? "-" : rarity_cell(rarest->rarity));
    const bool at_none = rarest == nullptr || is_common(rarest->rarity);
    cells.push_back(at_none ? "-" : duration_label(rarest->duration_h));
    return cells;
}

std::string count_text(std::size_t count, std::string_view one, std::string_view many) {
    return fmt::format("{} {}", count, count == 1 ? one : many);
}

std::string rule_words(const EventList& list) {
    std::string out = "at least " + duration_label(list.rule.dry_spell_h);
    if (!(list.rule.threshold_mm > 0.0)) return out + " without rain";
    return out + " with less than " +
           list.display.parameter(list.rule.threshold_mm, Dimension::depth) + " of rain";
}

/// What the reader met, one thing to a line.
std::string notes_lines(const GaugeRecord& record) {
    const RecordNotes& notes = record.notes;
    std::string out;
    const auto tell = [&](std::size_t count, std::string_view one, std::string_view many,
                          std::string_view taken) {
        if (count > 0) out += fmt::format("  {}: {}\n", count_text(count, one, many), taken);
    };
    tell(notes.same_instant, "tip at the instant of the tip before it",
         "tips at the instant of the tip before them", "each counts");
    tell(notes.repeated_rows, "row of an overlapping download", "rows of an overlapping download",
         "dropped");
    tell(notes.clock_set_back, "time that the clock went back", "times that the clock went back",
         "the tips keep their stamps and are put in order");
    tell(notes.counter_restarts, "time that the running count fell",
         "times that the running count fell", "taken as a restart from 0");
    tell(notes.repeated_headers, "header row in the midst", "header rows in the midst",
         "passed over");
    if (notes.partial_last_line) out += "  a last line that was cut short: dropped\n";
    return out;
}

std::string record_part(const EventList& list, const RecordClock& clock) {
    const GaugeRecord& record = list.record;
    const RecordSpan span = span_of(record);
    std::string out =
        fmt::format("Record\n  {} to {}, {} of rain in {}", clock.full(span.from_ms),
                    clock.full(span.to_ms), list.display.depth_with_unit(total_depth_mm(record)),
                    count_text(record.notes.rows, "row", "rows"));
    if (const auto* tips = std::get_if<TipLog>(&record.rain)) {
        out += " of tips, " + list.display.parameter(tips->tip_mm, Dimension::depth) + " each\n";
        if (tips->clock_assumed)
            out += "  the stamps carry no zone, so the clock is assumed never to change\n";
    } else {
        const auto& rain = std::get<Hyetograph>(record.rain);
        out += "\n";
        if (rain.taken_as_dry_h > 0.0)
            out +=
                "  " + duration_text(rain.taken_as_dry_h) + " of it without data, taken as dry\n";
        if (rain.clock_assumed)
            out += "  the stamps carry no zone, so the clock is assumed never to change\n";
    }
    return out + notes_lines(record);
}

std::string without_data_line(const RecordEvents& found) {
    std::string list;
    for (const RainEvent& event : found.events)
        if (event.without_data_h > 0.0)
            list += fmt::format("{}{} of event {}", list.empty() ? "" : ", ",
                                duration_text(event.without_data_h), event.number);
    if (list.empty()) return {};
    return wrapped("  Without data and taken as dry: ", list, kPageWidth, kHangingIndent);
}

std::string footnotes(const EventList& list) {
    const auto& events = list.found.events;
    std::string out = without_data_line(list.found);
    if (!std::ranges::all_of(events, &RainEvent::antecedent_known))
        out += "  * the record begins less than five days before: more may have fallen\n";
    if (!list.rarities.empty() && !events.empty())
        out += "  Rarity at the duration over which the event was rarest.\n";
    return out;
}

std::string events_part(const EventList& list, EventOrder order, const RecordClock& clock) {
    const auto& events = list.found.events;
    double inside_mm = 0.0;
    for (const RainEvent& event : events)
        inside_mm += event.depth_mm;
    std::string out =
        fmt::format("Events {}, parted by {}\n", order_words(order), rule_words(list));
    if (!events.empty()) {
        TextTable table = headed_table(list);
        for (const std::size_t row : sorted(list, order))
            table.row(cells_of(list, row, clock));
        out += table.text();
    }
    out += fmt::format("  {} with {}, and {} outside events\n",
                       count_text(events.size(), "event", "events"),
                       list.display.depth_with_unit(inside_mm),
                       list.display.depth_with_unit(list.found.outside_mm));
    return out + footnotes(list);
}

}  // namespace

std::string events_summary(const std::string& title, const GaugeRecord& record,
                           const EventRule& rule, const RecordEvents& events,
                           std::span<const EventRarity> rarities, EventOrder order,
                           const SummaryOptions& options) {
    const Display display(options.units);
    const EventList list{record, rule, events, rarities, display};
    const RecordClock clock(record);
    return printable(title) + "\n\n" + record_part(list, clock) + "\n" +
           events_part(list, order, clock) + rain_closing();
}

}  // namespace rainledger
