#pragma once

#include <algorithm>
#include <cmath>
#include <cstddef>
#include <tuple>
#include <utility>
#include <vector>

#include "rainledger/rain/rain_events.hpp"

// What a rule of dry spells makes of a record's pieces of rain.
namespace rainledger {

/// Pieces of rain in a row, by index.
struct ElementRun {
    std::size_t first = 0;
    std::size_t end = 0;
};

struct EventRuns {
    std::vector<ElementRun> runs;
    double outside_mm = 0.0;
};

/// Parts pieces of rain in order of time, each with a depth above 0, into events. Takes time by the
/// pieces, and by the sorting of those behind which a dry spell with rain in it could begin.
template <typename Elements>
class EventParting {
public:
    EventParting(const Elements& elements, const EventRule& rule)
        : elements_(elements),
          least_h_(rule.dry_spell_h - kSameLength_h),
          less_than_mm_(rule.threshold_mm - kSameDepth_mm),
          dropped_(elements.size(), false) {}

    [[nodiscard]] EventRuns runs() && {
        for (std::size_t first = 0; first < elements_.size();) {
            const ElementRun group{first, group_end(first)};
            if (less_than_mm_ > 0.0) drop_dry_spells(group);
            add_runs(group);
            first = group.end;
        }
        return std::move(found_);
    }

private:
    static constexpr double kSameLength_h = 1e-9;
    static constexpr double kSameDepth_mm = 1e-9;

    /// From the end of piece `first` to the start of piece `last`. In whole multiples of what is
    /// the same, so that equals are equal whatever was added up before them.
    struct Stretch {
        std::size_t first = 0;
        std::size_t last = 0;
        double rain = 0.0;
        double length = 0.0;
    };

    [[nodiscard]] double length_h(std::size_t first, std::size_t last) const {
        return elements_.start_h(last) - elements_.end_h(first);
    }

    [[nodiscard]] std::size_t group_end(std::size_t first) const {
        std::size_t end = first + 1;
        while (end < elements_.size() && length_h(end - 1, end) < least_h_)
            ++end;
        return end;
    }

    /// Behind each piece, the shortest stretch that is long enough, if it is dry enough too. The
    /// later a stretch begins, the later it ends, or at the same piece.
    void find_stretches(const ElementRun& group) {
        stretches_.clear();
        // Growing by and by would hold the stretches twice.
        stretches_.reserve(group.end - group.first);
        std::size_t last = group.first + 1;
        double held_mm = 0.0;
        for (std::size_t first = group.first; first < group.end; ++first) {
            for (; last < group.end && length_h(first, last) < least_h_; ++last)
                held_mm += elements_.depth_mm(last);
            if (last == group.end) return;
            if (held_mm < less_than_mm_)
                stretches_.push_back({first, last, std::round(held_mm / kSameDepth_mm),
                                      std::round(length_h(first, last) / kSameLength_h)});
            held_mm -= elements_.depth_mm(first + 1);
        }
    }

    /// Least rain first, so that a dry spell takes as little rain as it can.
    void drop_dry_spells(const ElementRun& group) {
        find_stretches(group);
        std::ranges::sort(stretches_, {}, [](const Stretch& stretch) {
            return std::tuple(stretch.rain, -stretch.length, stretch.first);
        });
        for (const Stretch& stretch : stretches_)
            if (is_free(stretch))
                std::fill(dropped_.begin() + static_cast<std::ptrdiff_t>(stretch.first + 1),
                          dropped_.begin() + static_cast<std::ptrdiff_t>(stretch.last), true);
    }

    /// Whether none of its pieces lies inside a stretch that was taken. Of two stretches the one
    /// that begins later does not end earlier, so one that overlaps this one reaches over its
    /// first or its last piece, or ends with it and reaches over the one before.
    [[nodiscard]] bool is_free(const Stretch& stretch) const {
        return !dropped_[stretch.first] && !dropped_[stretch.last - 1] && !dropped_[stretch.last];
    }

    /// What the dry spells leave of a group, each run of it an event if it holds enough.
    void add_runs(const ElementRun& group) {
        for (std::size_t first = group.first; first < group.end;) {
            const bool dry = dropped_[first];
            double depth_mm = 0.0;
            std::size_t end = first;
            for (; end < group.end && dropped_[end] == dry; ++end)
                depth_mm += elements_.depth_mm(end);
            if (dry || depth_mm < less_than_mm_) {
                found_.outside_mm += depth_mm;
            } else {
                found_.runs.push_back({first, end});
            }
            first = end;
        }
    }

    const Elements& elements_;
    double least_h_ = 0.0;
    double less_than_mm_ = 0.0;
    std::vector<Stretch> stretches_;
    std::vector<bool> dropped_;  ///< pieces inside a stretch that was taken
    EventRuns found_;
};

template <typename Elements>
[[nodiscard]] EventRuns event_runs(const Elements& elements, const EventRule& rule) {
    return EventParting<Elements>(elements, rule).runs();
}

}  // namespace rainledger
