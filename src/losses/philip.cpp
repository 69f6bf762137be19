#include "rainledger/losses/philip.hpp"
