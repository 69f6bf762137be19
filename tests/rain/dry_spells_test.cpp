#include <algorithm>
#include <cmath>
#include <cstddef>
#include <string>
#include <tuple>
#include <utility>
#include <vector>

#include "rain/event_helpers.hpp"
#include "rain/record_helpers.hpp"
#include "rain/synthetic_logger.hpp"

// The rule of dry spells with rain in them.
namespace rainledger {
namespace {

/// A piece of rain as the rule sees it.
struct Piece {
    double start_h = 0.0;
    double end_h = 0.0;
    double depth_mm = 0.0;
};

/// The header's words taken one by one: every stretch is looked at, every piece of it is asked.
class RuleByWords {
public:
    RuleByWords(std::vector<Piece> pieces, const EventRule& rule)
        : pieces_(std::move(pieces)), rule_(rule), dry_(pieces_.size(), false) {}

    Ranges events() {
        take_stretches();
        Ranges runs;
        for (std::size_t i = 0; i < pieces_.size(); ++i) {
            if (dry_[i]) continue;
            const bool goes_on = i > 0 && !dry_[i - 1] && !parted_before(i);
            if (!goes_on) runs.emplace_back(i, i);
            runs.back().second = i + 1;
        }
        std::erase_if(runs, [&](const auto& run) {
            return rain_mm(run.first, run.second) < rule_.threshold_mm - 1e-9;
        });
        return runs;
    }

private:
    struct Stretch {
        std::size_t first = 0;
        std::size_t last = 0;
    };

    double rain_mm(std::size_t first, std::size_t end) const {
        double sum_mm = 0.0;
        for (std::size_t i = first; i < end; ++i)
            sum_mm += pieces_[i].depth_mm;
        return sum_mm;
    }
    double length_h(const Stretch& stretch) const {
        return pieces_[stretch.last].start_h - pieces_[stretch.first].end_h;
    }
    bool long_enough(const Stretch& stretch) const {
        return length_h(stretch) >= rule_.dry_spell_h - 1e-9;
    }
    bool parted_before(std::size_t i) const { return long_enough({i - 1, i}); }
    bool in_one_group(const Stretch& stretch) const {
        for (std::size_t i = stretch.first + 1; i <= stretch.last; ++i)
            if (parted_before(i)) return false;
        return true;
    }

    std::vector<Stretch> stretches() const {
        std::vector<Stretch> all;
        for (std::size_t first = 0; first < pieces_.size(); ++first)
            for (std::size_t last = first + 1; last < pieces_.size(); ++last) {
                const Stretch stretch{first, last};
                if (!long_enough(stretch)) continue;
                if (in_one_group(stretch) && rain_mm(first + 1, last) < rule_.threshold_mm - 1e-9)
                    all.push_back(stretch);
                break;
            }
        return all;
    }

    void take_stretches() {
        std::vector<Stretch> left = stretches();
        const auto rank = [&](const Stretch& stretch) {
            return std::tuple(std::llround(rain_mm(stretch.first + 1, stretch.last) * 1e9),
                              -std::llround(length_h(stretch) * 1e9), stretch.first);
        };
        std::ranges::sort(left, {}, rank);
        for (const Stretch& stretch : left) {
            bool free = true;
            for (std::size_t i = stretch.first; i <= stretch.last; ++i)
                free = free && !dry_[i];
            for (std::size_t i = stretch.first + 1; free && i < stretch.last; ++i)
                dry_[i] = true;
        }
    }

    std::vector<Piece> pieces_;
    EventRule rule_;
    std::vector<bool> dry_;
};

std::vector<Piece> pieces_of(const TipLog& log) {
    std::vector<Piece> pieces;
    for (std::size_t i = 0; i < log.unix_ms.size(); ++i) {
        const double at_h = static_cast<double>(log.unix_ms[i] - log.unix_ms[0]) / 3.6e6;
        pieces.push_back({at_h, at_h, log.depth(i)});
    }
    return pieces;
}

/// Up to 40 tips, some at one instant; of 0.2 mm each, or of several in one.
GaugeRecord random_log(SeededNumbers& numbers) {
    std::vector<double> minutes;
    double at = 0.0;
    const std::size_t count = 1 + numbers.below(40);
    const std::size_t pace = 3 + numbers.below(7);
    for (std::size_t i = 0; i < count; ++i) {
        minutes.push_back(at);
        at += static_cast<double>(30 * numbers.below(pace));
    }
    GaugeRecord record = log_at(minutes);
    if (numbers.below(2) == 0)
        for (std::size_t i = 0; i < count; ++i)
            std::get<TipLog>(record.rain)
                .depth_mm.push_back(0.2 * static_cast<double>(1 + numbers.below(4)));
    return record;
}

EventRule random_rule(SeededNumbers& numbers) {
    return {0.5 * static_cast<double>(1 + numbers.below(12)),
            0.2 * static_cast<double>(numbers.below(9))};
}

double all_of_mm(const RecordEvents& found) {
    double sum_mm = found.outside_mm;
    for (const RainEvent& event : found.events)
        sum_mm += event.depth_mm;
    return sum_mm;
}

/// Hourly rain; zeros are dry.
GaugeRecord hourly(const std::vector<double>& depths_mm) {
    std::string text = "end [h],depth [mm]\n";
    for (std::size_t i = 0; i < depths_mm.size(); ++i)
        text += std::to_string(i + 1) + "," + std::to_string(depths_mm[i]) + "\n";
    RecordLayout layout;
    layout.csv.every_h = 1.0;
    return clean_record(text, layout);
}

}  // namespace

TEST_CASE("a little rain may fall in a dry spell, less than the threshold") {
    // Two tips at minute 200 join what a threshold above their 0.4 mm parts.
    const GaugeRecord joined = log_at({0, 1, 2, 200, 201, 400, 401, 402});
    CHECK(ranges_of(find_events(joined, {6.0, 0.0}, {})) == Ranges{{0, 8}});
    CHECK(ranges_of(find_events(joined, {6.0, 0.4}, {})) == Ranges{{0, 8}});
    const RecordEvents found = find_events(joined, {6.0, 0.5}, {});
    CHECK(ranges_of(found) == Ranges{{0, 3}, {5, 8}});
    CHECK_THAT(found.outside_mm, WithinAbs(0.4, 1e-12));
}

TEST_CASE("an event of at least the threshold keeps its weak ends, and less is no event") {
    const GaugeRecord lone = log_at({0, 100, 150, 151, 152, 153, 200, 300});
    for (const double threshold_mm : {0.0, 0.3, 1.0, 1.6}) {
        const RecordEvents found = find_events(lone, {6.0, threshold_mm}, {});
        CAPTURE(threshold_mm);
        CHECK(ranges_of(found) == Ranges{{0, 8}});
        CHECK(found.outside_mm == 0.0);
    }
    const RecordEvents none = find_events(lone, {6.0, 1.7}, {});
    CHECK(none.events.empty());
    CHECK_THAT(none.outside_mm, WithinAbs(1.6, 1e-12));
}

TEST_CASE("lone tips do not join two storms, and one of them may lead the second") {
    // Storms 12 h apart with single tips 4 h and 8 h behind the first.
    const GaugeRecord record = log_at({0, 1, 2, 242, 482, 722, 723, 724});
    CHECK(ranges_of(find_events(record, {6.0, 0.0}, {})) == Ranges{{0, 8}});
    const RecordEvents found = find_events(record, {6.0, 0.5}, {});
    CHECK(ranges_of(found) == Ranges{{0, 3}, {4, 8}});
    CHECK_THAT(found.outside_mm, WithinAbs(0.2, 1e-12));
}

TEST_CASE("of dry spells that overlap the one with the least rain counts") {
    // Hours 1 to 8 hold 0.3 mm, hours 5 to 12 hold 0.1 mm: the 0.3 mm stays with the first event.
    const GaugeRecord record = hourly({2, 0, 0, 0, 0.3, 0, 0, 0, 0.1, 0, 0, 0, 2});
    const RecordEvents found = find_events(record, {6.0, 0.35}, {});
    CHECK(ranges_of(found) == Ranges{{0, 5}, {12, 13}});
    CHECK_THAT(found.outside_mm, WithinAbs(0.1, 1e-12));
}

TEST_CASE("of dry spells with the same rain the longer counts, and then the earlier") {
    CHECK(ranges_of(find_events(hourly({2, 0, 0, 0.1, 0, 0, 0, 0.1, 0, 0, 0, 0, 2}), {6.0, 0.2},
                                {})) == Ranges{{0, 4}, {12, 13}});
    CHECK(ranges_of(find_events(hourly({2, 0, 0, 0, 0.1, 0, 0, 0, 0.1, 0, 0, 0, 2}), {6.0, 0.2},
                                {})) == Ranges{{0, 1}, {8, 13}});
}

TEST_CASE("lengths that differ by rounding alone are the same length") {
    // Of 0.1 h each, from the storm to the second lone tip and from the first to the next storm.
    for (int at = 10; at < 600; ++at) {
        const double m = at;
        const GaugeRecord record = log_at({0, m, m, m, m + 3, m + 6, m + 9, m + 9, m + 9});
        CAPTURE(at);
        REQUIRE(ranges_of(find_events(record, {0.1, 0.3}, {})) == Ranges{{1, 4}, {5, 9}});
    }
}

TEST_CASE("a piece of rain may bound two dry spells, and is an event if it holds enough") {
    const std::vector<double> depths_mm{1, 0, 0, 0, 0.2, 0, 0, 0, 0.6, 0, 0, 0, 0.2, 0, 0, 0, 1};
    const RecordEvents three = find_events(hourly(depths_mm), {6.0, 0.5}, {});
    CHECK(ranges_of(three) == Ranges{{0, 1}, {8, 9}, {16, 17}});
    CHECK_THAT(three.outside_mm, WithinAbs(0.4, 1e-12));
    const RecordEvents two = find_events(hourly(depths_mm), {6.0, 0.7}, {});
    CHECK(ranges_of(two) == Ranges{{0, 1}, {16, 17}});
    CHECK_THAT(two.outside_mm, WithinAbs(1.0, 1e-12));
}

TEST_CASE("events of small random records are those of the rule's words") {
    constexpr unsigned kSeed = 61;
    SeededNumbers numbers(kSeed);
    std::size_t with_rain_in_spells = 0;
    for (int round = 0; round < 10'000; ++round) {
        const GaugeRecord record = random_log(numbers);
        const EventRule rule = random_rule(numbers);
        const std::vector<Piece> pieces = pieces_of(tips_of(record));
        const RecordEvents found = find_events(record, rule, {});
        CAPTURE(kSeed, round, tips_of(record).unix_ms, tips_of(record).depth_mm, rule.dry_spell_h,
                rule.threshold_mm);
        REQUIRE(ranges_of(found) == RuleByWords(pieces, rule).events());
        REQUIRE_THAT(all_of_mm(found), WithinAbs(total_depth_mm(record), 1e-9));
        if (rule.threshold_mm == 0.0) REQUIRE(found.outside_mm == 0.0);
        if (found.outside_mm > 0.0 && found.events.size() > 1) ++with_rain_in_spells;
    }
    CHECK(with_rain_in_spells > 1000);
}

TEST_CASE("events of small random interval data are those of the rule's words") {
    constexpr unsigned kSeed = 64;
    SeededNumbers numbers(kSeed);
    for (int round = 0; round < 1000; ++round) {
        std::vector<double> depths_mm;
        for (std::size_t count = 2 + numbers.below(30); depths_mm.size() < count;)
            depths_mm.push_back(
                numbers.below(2) == 0 ? 0.0 : 0.1 * static_cast<double>(numbers.below(8)));
        const EventRule rule = random_rule(numbers);
        std::vector<Piece> pieces;
        std::vector<std::size_t> steps;
        for (std::size_t i = 0; i < depths_mm.size(); ++i) {
            if (!(depths_mm[i] > 0.0)) continue;
            const auto start_h = static_cast<double>(i);
            pieces.push_back({start_h, start_h + 1.0, depths_mm[i]});
            steps.push_back(i);
        }
        Ranges by_words;
        for (const auto& [first, end] : RuleByWords(pieces, rule).events())
            by_words.emplace_back(steps[first], steps[end - 1] + 1);
        CAPTURE(kSeed, round, depths_mm, rule.dry_spell_h, rule.threshold_mm);
        const GaugeRecord record = hourly(depths_mm);
        const RecordEvents found = find_events(record, rule, {});
        REQUIRE(ranges_of(found) == by_words);
        REQUIRE_THAT(all_of_mm(found), WithinAbs(total_depth_mm(record), 1e-9));
    }
}

TEST_CASE("no stretch within an event of a small random record is a dry spell") {
    constexpr unsigned kSeed = 62;
    SeededNumbers numbers(kSeed);
    for (int round = 0; round < 5000; ++round) {
        const GaugeRecord record = random_log(numbers);
        const EventRule rule = random_rule(numbers);
        const std::vector<Piece> pieces = pieces_of(tips_of(record));
        CAPTURE(kSeed, round, tips_of(record).unix_ms, tips_of(record).depth_mm, rule.dry_spell_h,
                rule.threshold_mm);
        for (const RainEvent& event : find_events(record, rule, {}).events) {
            REQUIRE(event.depth_mm >= rule.threshold_mm - 1e-9);
            for (std::size_t first = event.first; first < event.end; ++first) {
                double held_mm = 0.0;
                for (std::size_t last = first + 1; last < event.end; ++last) {
                    const bool is_long =
                        pieces[last].start_h - pieces[first].end_h >= rule.dry_spell_h - 1e-9;
                    REQUIRE_FALSE((is_long && held_mm < rule.threshold_mm - 1e-9));
                    held_mm += pieces[last].depth_mm;
                }
            }
        }
    }
}

TEST_CASE(
    "a record shorter than the dry spell is one event whole, or with less than the threshold "
    "none") {
    constexpr unsigned kSeed = 63;
    SeededNumbers numbers(kSeed);
    for (int round = 0; round < 2000; ++round) {
        const GaugeRecord record = random_log(numbers);
        const TipLog& log = tips_of(record);
        const double duration_h = pieces_of(log).back().start_h;
        const EventRule rule{duration_h + 0.5, 0.2 * static_cast<double>(numbers.below(60))};
        const bool enough = total_depth_mm(record) >= rule.threshold_mm - 1e-9;
        CAPTURE(kSeed, round, log.unix_ms, log.depth_mm, rule.threshold_mm);
        REQUIRE(ranges_of(find_events(record, rule, {})) ==
                (enough ? Ranges{{0, log.unix_ms.size()}} : Ranges{}));
    }
}

}  // namespace rainledger
