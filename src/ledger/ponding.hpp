#pragma once

#include <algorithm>

#include "ledger/find_instant.hpp"
#include "ledger/parts.hpp"
#include "rainledger/losses/law.hpp"

// The ponding solution: soil and depression storage under a constant supply.
//
// Let w be the supply (mm/h), fp the infiltration capacity, D the ponded depth with limit Dmax.
//
//   w <= fp, and D = 0 or the water is held     f = w, D stays                      ("free")
//   w > fp                                      f = fp, D grows at w - f to Dmax,
//                                               then excess runs at w - f           ("rising")
//   w <= fp, infiltrating pond with D > 0       f = fp, D falls at f - w until it is
//                                               gone or fp has fallen to w          ("falling")
//
// With w constant and fp never rising, a spell of constant supply passes through free, rising and
// falling stretches in a row of a few events: ponding starts, depression full, pond gone, capacity
// fallen to w. Each is solved for its instant; no substeps are taken. Within a stretch the balance
// is the law itself: excess = w dt - dF - dD.
namespace rainledger {

/// An instant within this fraction of a spell of its end is the end: the event then belongs to the
/// next spell. Keeps a store that fills exactly as the rain stops from running over by a rounding.
inline constexpr double kEndTolerance = 1.0e-12;

/// Depression storage of a surface.
struct Depression {
    double limit_mm = 0.0;  ///< Dmax
    bool infiltrates = true;
};

/// Where soil and storage stand between spells.
template <InfiltrationLaw Law>
struct PondState {
    typename Law::State soil;
    double depth_mm = 0.0;  ///< D
    bool ponded = false;    ///< infiltration is limited by capacity
};

/// What one stretch did, in mm over `duration_h`.
struct Stretch {
    double start_h = 0.0;  ///< from the start of the step
    double duration_h = 0.0;
    double infiltrated_mm = 0.0;
    double excess_mm = 0.0;
};

/// Carries soil and storage through spells of constant supply. `Events` is told of every stretch
/// and every change: stretch(Stretch), ponding_starts(h), ponding_ends(h), times from the step's
/// start. Excess that varies is told in parts short enough that each part's mean rate stands for it
/// (see parts.hpp).
template <InfiltrationLaw Law, class Events>
class Ponding {
public:
    /// `allowed_mm`: how far the excess told may be from the true one within a part; infinite if
    /// nobody receives it.
    Ponding(const Law& law, Depression depression, double allowed_mm, PondState<Law>& state,
            Events& events)
        : law_(law),
          depression_(depression),
          allowed_mm_(allowed_mm),
          state_(state),
          events_(events) {}

    /// One spell: supply w mm/h from `start_h` to `end_h` > start_h.
    void spell(double start_h, double end_h, double w) {
        at_ = start_h;
        end_ = end_h;
        left_ = end_h - start_h;
        smallest_ = kEndTolerance * left_;
        // Most spells of most storms are free from end to end; the rest is kept out of line.
        if (!state_.ponded && !falls_within(w)) {
            take_all(w, left_);
        } else {
            eventful_spell(w);
        }
    }

    /// True if a full store runs over all through a spell of supply w, and the excess may be told
    /// whole.
    [[nodiscard]] bool runs_over(double w) const {
        return state_.ponded && state_.depth_mm >= depression_.limit_mm && allowed_mm_ == kNever &&
               law_.time_at_capacity(state_.soil, w) <= 0.0;
    }

private:
    [[gnu::noinline]] void eventful_spell(double w) {
        bool fallen = false;  // capacity has fallen to w in this spell: it is rising to the end
        while (left_ > 0.0) {
            if (!state_.ponded) {
                fallen = free(w);
            } else if (fallen || law_.time_at_capacity(state_.soil, w) <= 0.0) {
                rising(w);
            } else {
                fallen = falling(w);
            }
        }
    }

    [[nodiscard]] bool falls_within(double w) const {
        return law_.time_below(state_.soil, w, left_) < left_ - smallest_;
    }

    void take_all(double w, double h) {
        if (w > 0.0) {
            law_.advance_below(state_.soil, w, h);
        } else {
            law_.rest(state_.soil, h);
        }
        pass(h, w * h, 0.0);
    }

    /// Below capacity until it has fallen to w; true if it has.
    bool free(double w) {
        const bool falls = falls_within(w);
        const double h = falls ? law_.time_below(state_.soil, w, left_) : left_;
        if (h > 0.0) take_all(w, h);
        if (falls) {
            state_.ponded = true;
            events_.ponding_starts(at_);
        }
        return falls;
    }

    /// Supply above a falling capacity: the store fills, then water runs off, to the spell's end.
    void rising(double w) {
        if (state_.depth_mm < depression_.limit_mm) fill(w);
        if (left_ > 0.0) run_off(w);
    }

    void fill(double w) {
        auto soil = state_.soil;
        double infiltrated = law_.advance_at_capacity(soil, left_);
        double depth = state_.depth_mm + w * left_ - infiltrated;
        double h = left_;
        const double room = kEndTolerance * (depression_.limit_mm + w * left_);
        if (depth > depression_.limit_mm + room) {
            h = instant_of_depth(w, depression_.limit_mm, left_);
            soil = state_.soil;
            infiltrated = law_.advance_at_capacity(soil, h);
            depth = depression_.limit_mm;
        }
        state_.soil = soil;
        state_.depth_mm = depth;
        pass(h, infiltrated, 0.0);
    }

    void run_off(double w) {
        if (allowed_mm_ == kNever) {
            run_off_for(w, left_);
            return;
        }
        const auto rate_after = [&](double h) {
            auto soil = state_.soil;
            law_.advance_at_capacity(soil, h);
            return law_.capacity(soil);
        };
        const double coarsest = for_each_part(
            left_, allowed_mm_, rate_after, [&](double h) { run_off_for(w, std::min(h, left_)); });
        if (coarsest > allowed_mm_) events_.coarse(coarsest);
    }

    void run_off_for(double w, double h) {
        const double infiltrated = law_.advance_at_capacity(state_.soil, h);
        // Not negative but for the last bit, where w is the capacity.
        pass(h, infiltrated, std::max(0.0, w * h - infiltrated));
    }

    /// Capacity above the supply in a ponded state: what is stored drains. True if capacity has
    /// fallen to w before the pond was gone.
    bool falling(double w) {
        if (!depression_.infiltrates || state_.depth_mm == 0.0) {
            end_ponding();
            return false;
        }
        const double turn = law_.time_at_capacity(state_.soil, w);
        const bool turns = turn < left_ - smallest_;
        double h = turns ? turn : left_;
        auto soil = state_.soil;
        double infiltrated = law_.advance_at_capacity(soil, h);
        double depth = state_.depth_mm + w * h - infiltrated;
        const bool gone = depth <= kEndTolerance * state_.depth_mm;
        if (gone) {
            if (depth < 0.0) {
                h = instant_of_depth(w, 0.0, h);
                soil = state_.soil;
                infiltrated = law_.advance_at_capacity(soil, h);
            }
            depth = 0.0;
        }
        state_.soil = soil;
        state_.depth_mm = depth;
        pass(h, infiltrated, 0.0);
        if (gone) end_ponding();
        return turns && !gone;
    }

    void end_ponding() {
        state_.ponded = false;
        events_.ponding_ends(at_);
    }

    /// The instant in (0, until) at which D, infiltrating at capacity under w, reaches `target`; D
    /// moves one way in that time and passes it.
    [[nodiscard]] double instant_of_depth(double w, double target, double until) const {
        const auto excess_depth = [&](double h) {
            auto soil = state_.soil;
            const double infiltrated = law_.advance_at_capacity(soil, h);
            return DepthAndRate{state_.depth_mm - target + w * h - infiltrated,
                                w - law_.capacity(soil)};
        };
        return find_instant(excess_depth, until);
    }

    void pass(double h, double infiltrated, double excess) {
        events_.stretch({at_, h, infiltrated, excess});
        if (h >= left_) {
            at_ = end_;
            left_ = 0.0;
        } else {
            at_ += h;
            left_ -= h;
        }
    }

    const Law& law_;
    Depression depression_;
    double allowed_mm_;
    PondState<Law>& state_;
    Events& events_;
    double at_ = 0.0;
    double end_ = 0.0;
    double left_ = 0.0;
    double smallest_ = 0.0;
};

}  // namespace rainledger
